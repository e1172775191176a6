import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { quantile } from '../../../src/core/review/quantile.ts';
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
  });

  test('as reckoned from the sorted values', () => {
    const alike = fc.array(fc.integer({ min: 0, max: 5 }), { minLength: 1, maxLength: 300 });
    fc.assert(
      fc.property(fc.oneof(values, alike), probability, (list, share) => {
        const sorted = [...list].sort((a, b) => a - b);
        const position = (sorted.length - 1) * share;
        const lower = sorted[Math.floor(position)] ?? NaN;
        const upper = sorted[Math.ceil(position)] ?? NaN;
        expect(quantile(list, share)).toBeCloseTo(lower + (position - Math.floor(position)) * (upper - lower), 5);
      }),
      { numRuns: 300 },
    );
  });
});

describe('ratios', () => {
  test('of nothing there is none', () => {
    expect(ratioOf(0, 0)).toBeNull();
    expect(wilsonInterval(0, 0)).toBeNull();
  });

  test('none of many and all of many reach 0 and 1 exactly', () => {
    for (let of = 1; of <= 2000; of += 1) {
      expect(wilsonInterval(0, of)?.low).toBe(0);
      expect(wilsonInterval(of, of)?.high).toBe(1);
    }
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
