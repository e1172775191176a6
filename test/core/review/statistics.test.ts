import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { quantile, quantileOfSorted } from '../../../src/core/review/quantile.ts';
import { ratioOf } from '../../../src/core/review/ratio.ts';
import { wilsonInterval } from '../../../src/core/review/wilson.ts';

/** Without -0, which an order of numbers does not tell from 0. */
const anyNumber = fc.double({ min: -1e9, max: 1e9, noNaN: true }).map((value) => value + 0);
const values = fc.array(anyNumber, { minLength: 1, maxLength: 30 });
const probability = fc.double({ min: 0, max: 1, noNaN: true });

describe('quantiles', () => {
  test('of nothing there is none', () => {
    expect(quantile([], 0.5)).toBeNull();
  });

  test('ends are the least and the greatest, also beyond 0 and 1', () => {
    fc.assert(
      fc.property(values, (list) => {
        expect(quantile(list, -0.5)).toBe(Math.min(...list));
        expect(quantile(list, 1.5)).toBe(Math.max(...list));
      }),
      { numRuns: 200 },
    );
  });

  test('a greater share never has a smaller quantile', () => {
    fc.assert(
      fc.property(values, probability, probability, (list, a, b) => {
        const low = quantile(list, Math.min(a, b)) ?? NaN;
        const high = quantile(list, Math.max(a, b)) ?? NaN;
        expect(low).toBeLessThanOrEqual(high + Math.abs(high) * 1e-12);
      }),
      { numRuns: 200 },
    );
  });

  test('the values are left as they are', () => {
    const list = [3, 1, 2];
    expect(quantile(list, 0.5)).toBe(2);
    expect(list).toEqual([3, 1, 2]);
    expect(quantileOfSorted([1, 2, 3, 4], 0.5)).toBe(2.5);
  });
});

describe('ratios', () => {
  test('of nothing there is none', () => {
    expect(ratioOf(0, 0)).toBeNull();
    expect(wilsonInterval(0, 0)).toBeNull();
  });

  const counts = fc
    .integer({ min: 1, max: 5000 })
    .chain((of) => fc.tuple(fc.integer({ min: 0, max: of }), fc.constant(of)));

  test('the interval lies within 0 and 1, holds the share, and mirrors the interval of the rest', () => {
    fc.assert(
      fc.property(counts, ([count, of]) => {
        const ratio = ratioOf(count, of);
        const rest = ratioOf(of - count, of);
        if (!ratio || !rest) throw new Error('a ratio of something');
        expect(ratio.low).toBeGreaterThanOrEqual(0);
        expect(ratio.high).toBeLessThanOrEqual(1);
        expect(ratio.low).toBeLessThanOrEqual(ratio.share);
        expect(ratio.high).toBeGreaterThanOrEqual(ratio.share);
        expect(ratio.low).toBeCloseTo(1 - rest.high, 12);
      }),
      { numRuns: 300 },
    );
  });

  test('each bound is where the score test just reaches its limit', () => {
    // Wilson 1927: the bounds are the p with |share - p| = z * sqrt(p (1 - p) / n).
    fc.assert(
      fc.property(counts, ([count, of]) => {
        const interval = wilsonInterval(count, of);
        if (!interval) throw new Error('an interval of something');
        for (const p of [interval.low, interval.high]) {
          if (p === 0 || p === 1) continue;
          const standardError = Math.sqrt((p * (1 - p)) / of);
          expect(Math.abs(count / of - p) / standardError).toBeCloseTo(1.959963984540054, 6);
        }
      }),
      { numRuns: 300 },
    );
  });
});
