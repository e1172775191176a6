import fc from 'fast-check';
import { expect, test } from 'vitest';
import { parseNumber } from '../../src/ui/parse-number.ts';

const oven = { lowest: -20, highest: 400, unit: '°C', decimals: 1 };
const read = (typed: string) => {
  const result = parseNumber(typed, oven);
  return result.ok ? result.value : result.error.code;
};

test.each([
  ['92', 92],
  ['92,5', 92.5],
  ['92.5', 92.5],
  [' 92 ', 92],
  ['+4', 4],
  ['-5', -5],
  ['−5', -5],
  [',5', 0.5],
  ['7.', 7],
  ['-0', 0],
  ['', 'empty'],
  ['   ', 'empty'],
  ['1.000,5', 'thousands sign'],
  ['1,000,000', 'thousands sign'],
  ['1e3', 'not a number'],
  ['ninety', 'not a number'],
  ['<b>92</b>', 'not a number'],
  ['0x10', 'not a number'],
  ['Infinity', 'not a number'],
  ['.', 'not a number'],
  ['92.55', 'too many decimals'],
  ['1000', 'too high'],
  ['-21', 'too low'],
])('"%s" reads as %s', (typed, expected) => {
  expect(read(typed)).toBe(expected);
});

test('comma and point mean the same', () => {
  fc.assert(
    fc.property(fc.integer({ min: -200, max: 4000 }), (tenths) => {
      const typed = (tenths / 10).toFixed(1);
      expect(read(typed)).toBeCloseTo(tenths / 10, 9);
      expect(read(typed.replace('.', ','))).toBe(read(typed));
    }),
    { numRuns: 200 },
  );
});

test('any text gives a number inside the range or a code', () => {
  fc.assert(
    fc.property(fc.string(), (typed) => {
      const result = parseNumber(typed, oven);
      if (result.ok) expect(result.value >= -20 && result.value <= 400).toBe(true);
      else expect(result.error.unit).toBe('°C');
    }),
    { numRuns: 500 },
  );
});
