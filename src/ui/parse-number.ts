import { failed, ok, type Result } from '../core/unit/result.ts';

/** What a typed number must be. The unit is for the sentence at the field only. */
export interface NumberRule {
  readonly lowest: number;
  readonly highest: number;
  readonly unit: string;
  /** Digits after the decimal sign that mean something; more are refused rather than rounded. */
  readonly decimals: number;
}

export type NumberProblem =
  | { readonly code: 'empty'; readonly unit: string }
  | { readonly code: 'not a number'; readonly typed: string; readonly unit: string }
  | { readonly code: 'thousands sign'; readonly typed: string; readonly unit: string }
  | { readonly code: 'too many decimals'; readonly decimals: number; readonly unit: string }
  | { readonly code: 'too low'; readonly lowest: number; readonly unit: string }
  | { readonly code: 'too high'; readonly highest: number; readonly unit: string };

/**
 * Reads typed text with a decimal comma or a decimal point. A text with both, or with one of them twice, is refused:
 * a guessed thousands sign would be wrong by a factor of a thousand.
 */
export function parseNumber(typed: string, rule: NumberRule): Result<number, NumberProblem> {
  const { unit } = rule;
  const text = typed.trim().replace(/[−–]/gu, '-');
  if (text === '') return failed({ code: 'empty', unit });
  if ((text.match(/[.,]/g) ?? []).length > 1) return failed({ code: 'thousands sign', typed, unit });
  const match = /^[+-]?(?:\d+(?:[.,](\d*))?|[.,](\d+))$/.exec(text);
  if (match === null || text.length > 20) return failed({ code: 'not a number', typed, unit });
  const decimals = (match[1] ?? match[2] ?? '').length;
  if (decimals > rule.decimals) return failed({ code: 'too many decimals', decimals: rule.decimals, unit });
  const value = Number(text.replace(',', '.')) + 0;
  if (value < rule.lowest) return failed({ code: 'too low', lowest: rule.lowest, unit });
  if (value > rule.highest) return failed({ code: 'too high', highest: rule.highest, unit });
  return ok(value);
}
