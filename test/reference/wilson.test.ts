import { describe, expect, test } from 'vitest';
import { wilsonInterval } from '../../src/core/review/wilson.ts';

/** Source: R 4.2.2, `prop.test(count, of, conf.level = ..., correct = FALSE)$conf.int`, frozen on 2026-12-01. */
const rows = [
  { count: 7, of: 50, confidence: '95 %', low: 0.0695083342701629, high: 0.261861937105855 },
  { count: 7, of: 20, confidence: '95 %', low: 0.181191824101082, high: 0.567145723314764 },
  { count: 0, of: 20, confidence: '95 %', low: 0, high: 0.161125158052819 },
  { count: 20, of: 20, confidence: '95 %', low: 0.838874841947181, high: 1 },
  { count: 47, of: 48, confidence: '95 %', low: 0.891007820047481, high: 0.996312889022489 },
  { count: 96, of: 96, confidence: '95 %', low: 0.9615244121, high: 1 },
  { count: 4, of: 20, confidence: '90 %', low: 0.093118016581211, high: 0.378376685835368 },
] as const;

describe('Wilson intervals against R', () => {
  test.each(rows)('$count of $of at $confidence', ({ count, of, confidence, low, high }) => {
    const interval = wilsonInterval(count, of, confidence);
    const digits = count === 96 ? 10 : 14;
    expect(interval?.low).toBeCloseTo(low, digits);
    expect(interval?.high).toBeCloseTo(high, digits);
  });

  test('is not the form with continuity correction (R: 7 of 50 gives 0.0627700895 to 0.2735637622)', () => {
    expect(wilsonInterval(7, 50)?.low).not.toBeCloseTo(0.0627700895262104, 4);
  });
});
