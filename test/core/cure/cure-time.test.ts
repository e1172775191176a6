import { describe, expect, test } from 'vitest';
import { cureRange, minutesToCure, pairsFrom } from '../../../src/core/cure/cure-time.ts';
import { adhesive } from './bench-of-ovens.ts';

describe('minutes to a full cure', () => {
  test.each(adhesive.curePairs)('are the maker’s own at $temperatureC °C', ({ temperatureC, minutes }) => {
    expect(minutesToCure(adhesive, temperatureC)).toBe(minutes);
  });

  test('do not depend on the order in which the pairs stand', () => {
    const turned = { ...adhesive, curePairs: [...adhesive.curePairs].reverse() };
    expect(minutesToCure(turned, 92)).toBe(minutesToCure(adhesive, 92));
  });

  // ln t linear in 1/T between 80 °C/60 min and 100 °C/20 min, reckoned apart from this code.
  test('follow ln t against 1/T between two pairs', () => {
    expect(minutesToCure(adhesive, 92)).toBeCloseTo(30.59191076245646, 10);
    expect(minutesToCure(adhesive, 110)).toBeCloseTo(12.498761640600993, 10);
  });

  test('are endless below the lowest temperature, and only below it', () => {
    expect(minutesToCure(adhesive, 79.999)).toBe(Infinity);
    expect(minutesToCure(adhesive, 80)).toBe(60);
  });

  test('carry the slope of the lowest two pairs on down to the lowest temperature', () => {
    const lower = { ...adhesive, lowestC: 70 };
    // From the line through 80 °C/60 min and 100 °C/20 min, reckoned apart from this code.
    expect(minutesToCure(lower, 70)).toBeCloseTo(109.03554983285, 9);
    expect(minutesToCure(lower, 69.9)).toBe(Infinity);
  });

  test('are those of the top pair above it', () => {
    expect(minutesToCure(adhesive, 200)).toBe(8);
  });

  test('with a single pair are endless below it and the pair’s own from it on', () => {
    const single = { curePairs: [{ temperatureC: 100, minutes: 20 }], lowestC: 60, highestC: 130 };
    expect(minutesToCure(single, 99.99)).toBe(Infinity);
    expect(minutesToCure(single, 100)).toBe(20);
    expect(minutesToCure(single, 125)).toBe(20);
  });

  test('are endless where no temperature is known', () => {
    expect(minutesToCure(adhesive, NaN)).toBe(Infinity);
  });
});

test('a temperature is flagged where the maker vouches for nothing', () => {
  expect([79, 80, 120, 121, 130, 131].map((temperatureC) => cureRange(adhesive, temperatureC))).toEqual([
    'too cold',
    'within',
    'within',
    'above top pair',
    'above top pair',
    'above highest',
  ]);
});

test('pairs are computed from one pair and an activation energy', () => {
  const pairs = pairsFrom({ temperatureC: 100, minutes: 20 }, 60, [85, 100, 120]);
  expect(pairs[0]?.minutes).toBeCloseTo(44.95605384571574, 9);
  expect(pairs[1]).toEqual({ temperatureC: 100, minutes: 20 });
  expect(pairs[2]?.minutes).toBeCloseTo(7.477777921935685, 9);
});
