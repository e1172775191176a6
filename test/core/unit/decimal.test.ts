import { describe, expect, test } from 'vitest';
import { decimal, isAtLeast, isAtMost } from '../../../src/core/unit/decimal.ts';

describe('decimal', () => {
  test('clears what binary numbers add', () => {
    expect(-20 - -21.575).not.toBe(1.575);
    expect(decimal(-20 - -21.575)).toBe(1.575);
    expect(Object.is(decimal(-1e-9), 0)).toBe(true);
  });

  test('a value on a limit is on it, a millionth past it is not', () => {
    expect(0.1 + 0.2 <= 0.3).toBe(false);
    expect(isAtMost(0.1 + 0.2, 0.3)).toBe(true);
    expect(isAtMost(0.300001, 0.3)).toBe(false);
    expect(isAtLeast(0.299999, 0.3)).toBe(false);
  });

  test('nothing is at a limit that is no number', () => {
    expect([isAtMost(NaN, 1), isAtLeast(NaN, 1), isAtMost(1, NaN)]).toEqual([false, false, false]);
    expect(isAtMost(5, Infinity)).toBe(true);
  });
});
