import { describe, expect, test } from 'vitest';
import { speedRatio } from '../../src/core/cure/arrhenius.ts';
import type { Course } from '../../src/core/cure/course.ts';
import { minutesToCure, pairsFrom } from '../../src/core/cure/cure-time.ts';
import { lawFromRate } from '../../src/core/cure/dose-law.ts';
import { integrate } from '../../src/core/cure/dose.ts';

const minuteMs = 60_000;

// Computed table of this project's facts, section 7.2: factors relative to 100 °C, K = C + 273.15, R = 8.314463.
const temperaturesC = [23, 65, 80, 90, 95, 105, 110, 120, 130];
const table = [
  { activation: 50, factors: [0.0151, 0.1886, 0.4014, 0.6416, 0.8034, 1.2375, 1.5229, 2.2701, 3.3176] },
  { activation: 60, factors: [0.0066, 0.1351, 0.3345, 0.5871, 0.769, 1.2914, 1.6565, 2.6746, 4.2169] },
  { activation: 70, factors: [0.0028, 0.0968, 0.2787, 0.5373, 0.7361, 1.3476, 1.8019, 3.1511, 5.3599] },
];

describe.each(table)('with $activation kJ/mol', ({ activation, factors }) => {
  test.each(temperaturesC.map((temperatureC, index) => ({ temperatureC, factor: factors[index] ?? NaN })))(
    'an epoxy cures $factor times as fast at $temperatureC °C as at 100 °C',
    ({ temperatureC, factor }) => {
      expect(speedRatio(activation, temperatureC, 100)).toBeCloseTo(factor, 4);
    },
  );
});

// Same section: speed gained per 10 °C, at 25 °C and at 100 °C.
test.each([
  { activation: 50, at25: 1.924, at100: 1.523 },
  { activation: 60, at25: 2.193, at100: 1.657 },
  { activation: 70, at25: 2.5, at100: 1.802 },
])('$activation kJ/mol doubles per 10 °C only near room temperature', ({ activation, at25, at100 }) => {
  expect(speedRatio(activation, 35, 25)).toBeCloseTo(at25, 3);
  expect(speedRatio(activation, 110, 100)).toBeCloseTo(at100, 3);
});

// Same section: with 60 kJ/mol, 20 min at 100 °C are 59.8 min at 80 °C and 7.5 min at 120 °C.
test('pairs computed from one pair and 60 kJ/mol', () => {
  const pairs = pairsFrom({ temperatureC: 100, minutes: 20 }, 60, [80, 100, 120]);
  expect(pairs.map(({ minutes }) => Math.round(minutes * 10) / 10)).toEqual([59.8, 20, 7.5]);
  // Interpolation between computed pairs is the Arrhenius law that they came from.
  const law = { curePairs: pairs, lowestC: 80, highestC: 130 };
  expect(minutesToCure(law, 90)).toBeCloseTo(20 / speedRatio(60, 90, 100), 10);
});

describe('a ramp from 25 to 100 °C in 10 min, then 20 min at 100 °C, 60 kJ/mol', () => {
  const law = lawFromRate((temperatureC) => speedRatio(60, temperatureC, 100) / minuteMs);
  const ramp: Course = [
    { fromMs: 0, toMs: 10 * minuteMs, shape: { kind: 'linear', startC: 25, endC: 100 } },
    { fromMs: 10 * minuteMs, toMs: Infinity, shape: { kind: 'constant', temperatureC: 100 } },
  ];

  // Computed, same section: 22.3293 min.
  test('is worth 22.3293 min at 100 °C', () => {
    expect(integrate(ramp, law, 0, 30 * minuteMs)).toBeCloseTo(22.3293, 4);
  });

  // Computed, same section: what a trapezoid on samples would have said.
  test.each([
    { everyMinutes: 1, said: 22.3613 },
    { everyMinutes: 5, said: 23.0956 },
  ])('is overrated by a trapezoid on samples every $everyMinutes min', ({ everyMinutes, said }) => {
    let sum = 0;
    for (let minute = 0; minute < 30; minute += everyMinutes) {
      const rate = (one: number) => speedRatio(60, Math.min(100, 25 + 7.5 * one), 100);
      sum += ((rate(minute) + rate(minute + everyMinutes)) / 2) * everyMinutes;
    }
    expect(sum).toBeCloseTo(said, 4);
    expect(sum).toBeGreaterThan(integrate(ramp, law, 0, 30 * minuteMs));
  });
});
