import { expect, test } from 'vitest';
import { countDownText } from '../../src/ui/count-down-text.ts';

test.each([
  [27_000, '0:27'],
  [26_001, '0:27'],
  [2_170_000, '36:10'],
  [3_600_000, '1:00:00'],
  [3_599_000, '59:59'],
  [90_061_000, '25:01:01'],
  [0, '0:00'],
  [-1, '+0:00'],
  [-41_999, '+0:41'],
  [-3_661_000, '+1:01:01'],
])('%d ms reads %s', (ms, text) => {
  expect(countDownText(ms)).toBe(text);
});
