import { failed, ok, type Result } from '../core/unit/result.ts';

/** Serial numbers by a pattern: the last number in the first serial counts up, with its leading zeros kept. */
export function serialsFrom(first: string, count: number): Result<string[], 'no number'> {
  const match = /^(.*?)(\d+)(\D*)$/su.exec(first.trim());
  const [, before = '', digits = '', after = ''] = match ?? [];
  if (digits === '' || digits.length > 15) return failed('no number');
  const start = Number(digits);
  return ok(
    Array.from({ length: count }, (_, index) => before + String(start + index).padStart(digits.length, '0') + after),
  );
}
