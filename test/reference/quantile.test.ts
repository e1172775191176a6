import { describe, expect, test } from 'vitest';
import { quantile } from '../../src/core/review/quantile.ts';

/**
 * Source: R 4.2.2, `quantile(x, c(.10, .25, .50, .75, .90), type = 7)`, rows frozen from a run on 2026-12-01.
 * Type 7 is definition 7 of Hyndman and Fan, The American Statistician 50 (1996), 361-365.
 */
const probabilities = [0.1, 0.25, 0.5, 0.75, 0.9];
const rows = [
  { values: [1, 12, 14, 3, 96, 111], expected: [2, 5.25, 13, 75.5, 103.5] },
  { values: [2, 3, 5, 7, 11, 13, 17, 19, 23, 29], expected: [2.9, 5.5, 12, 18.5, 23.6] },
];

describe('quantiles against R type 7', () => {
  for (const { values, expected } of rows) {
    test.each(probabilities.map((probability, index) => [probability, expected[index] ?? NaN]))(
      `${values.join(' ')} at %f is %f`,
      (probability, value) => {
        expect(quantile(values, probability)).toBeCloseTo(value, 12);
      },
    );
  }

  test('is no other type: the 90th percentile of the first row tells types 1 to 9 apart from 7', () => {
    const otherTypes = [111, 111, 96, 102, 109.5, 111, 111, 111];
    const [first] = rows;
    expect(otherTypes).not.toContain(quantile(first?.values ?? [], 0.9));
  });
});
