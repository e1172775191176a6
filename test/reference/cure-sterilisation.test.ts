import { describe, expect, test } from 'vitest';
import type { Course } from '../../src/core/cure/course.ts';
import { lawFromRate } from '../../src/core/cure/dose-law.ts';
import { integrate, solve } from '../../src/core/cure/dose.ts';

// The integrator takes any rate. Sterilisation's is log-linear in temperature and its checks are published:
// F0 = SUM 10^((T - Tr)/z) dt with z = 10 °C.
const minuteMs = 60_000;
const f0 = (referenceC: number, zC = 10) =>
  lawFromRate((temperatureC) => 10 ** ((temperatureC - referenceC) / zC) / minuteMs);
const hold = (temperatureC: number): Course => [
  { fromMs: 0, toMs: Infinity, shape: { kind: 'constant', temperatureC } },
];

describe('F0, in minutes', () => {
  // Formula and the first two values: F0 note (public document 377248). The third value is computed from its formula.
  test.each([
    { temperatureC: 111, minutes: 1.5, digits: 12 },
    { temperatureC: 121, minutes: 15, digits: 12 },
    { temperatureC: 124, minutes: 29.93, digits: 2 },
  ])('15 min at $temperatureC °C is $minutes min at 121 °C', ({ temperatureC, minutes, digits }) => {
    expect(integrate(hold(temperatureC), f0(121), 0, 15 * minuteMs)).toBeCloseTo(minutes, digits);
  });

  // dairyscience.info, F-value page: 0.077 at 110 °C with Tr 121.11 and z 10 (0.07745 unrounded, computed).
  test('one minute at 110 °C is 0.077 min at 121.11 °C', () => {
    expect(integrate(hold(110), f0(121.11), 0, minuteMs)).toBeCloseTo(0.07745, 5);
  });

  // Computed: closed integral of the ramp, (10/(2 ln 10)) x (1 - 10^-2.11) with Tr 121.1.
  test('a ramp of 2 °C/min from 100 to 121.1 °C is 2.1546 min', () => {
    const ramp: Course = [{ fromMs: 0, toMs: 10.55 * minuteMs, shape: { kind: 'linear', startC: 100, endC: 121.1 } }];
    const dose = integrate(ramp, f0(121.1), 0, 10.55 * minuteMs);
    expect(dose).toBeCloseTo(2.1546, 4);
    const closed = (10 / (2 * Math.LN10)) * (1 - 10 ** -2.11);
    expect(Math.abs(dose / closed - 1)).toBeLessThan(1e-12);
  });

  // The first published value read backwards: 1.5 min of F0 takes 15 min at 111 °C.
  test('the time for a dose is the same check backwards', () => {
    expect(solve(hold(111), f0(121), 0, 1.5)).toBeCloseTo(15 * minuteMs, 6);
  });
});

// Pasteurisation units: t x 1.393^(T - 60). From memory; values per minute computed from it.
test.each([
  { temperatureC: 55, units: 0.1907 },
  { temperatureC: 62, units: 1.9404 },
  { temperatureC: 65, units: 5.2451 },
  { temperatureC: 70, units: 27.511 },
])('one minute at $temperatureC °C is $units pasteurisation units', ({ temperatureC, units }) => {
  const law = lawFromRate((one) => 1.393 ** (one - 60) / minuteMs);
  expect(integrate(hold(temperatureC), law, 0, minuteMs)).toBeCloseTo(units, 3);
});
