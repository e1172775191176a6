import { describe, expect, test } from 'vitest';
import { cureDoseLaw } from '../../../src/core/cure/cure-time.ts';
import type { Course } from '../../../src/core/cure/course.ts';
import { lawFromRate } from '../../../src/core/cure/dose-law.ts';
import { firstCountsMs, integrate, solve } from '../../../src/core/cure/dose.ts';
import { adhesive, minutes } from './bench-of-ovens.ts';

const constant = (temperatureC: number): Course => [
  { fromMs: 0, toMs: Infinity, shape: { kind: 'constant', temperatureC } },
];
const law = cureDoseLaw(adhesive);
/** Tenfold per 10 °C has closed integrals: 10^(T/10) per ms. */
const tenfold = lawFromRate((temperatureC) => 10 ** (temperatureC / 10));

describe('dose', () => {
  test('along a ramp meets the closed integral', () => {
    const ramp: Course = [{ fromMs: 0, toMs: 1e6, shape: { kind: 'linear', startC: -20, endC: 40 } }];
    // Integral of 10^((-20 + 60 t/1e6)/10) dt = 1e6 (10^4 - 10^-2) / (6 ln 10).
    const closed = (1e6 * (1e4 - 1e-2)) / (6 * Math.LN10);
    expect(Math.abs(integrate(ramp, tenfold, 0, 1e6) / closed - 1)).toBeLessThan(1e-12);
  });

  test('along a lag meets the closed integral of a rate that is linear in temperature', () => {
    const lag: Course = [
      { fromMs: 0, toMs: Infinity, shape: { kind: 'lag', startC: 20, towardC: 100, constantMs: 1000 } },
    ];
    const perDegree = lawFromRate((temperatureC) => temperatureC);
    // Integral of 100 - 80 exp(-t/1000) from 0 to 3000.
    const closed = 100 * 3000 - 80_000 * (1 - Math.exp(-3));
    expect(Math.abs(integrate(lag, perDegree, 0, 3000) / closed - 1)).toBeLessThan(1e-13);
  });

  test('of a lag that has long arrived is that of its target', () => {
    const lag: Course = [
      { fromMs: 0, toMs: Infinity, shape: { kind: 'lag', startC: 23, towardC: 100, constantMs: 1000 } },
    ];
    const late = integrate(lag, law, minutes(10), minutes(30));
    expect(late).toBeCloseTo(1, 12);
    expect(solve(lag, law, minutes(10), 5)).toBeCloseTo(minutes(110), 6);
  });

  test('is split where the law jumps: nothing below the lowest temperature is smeared over', () => {
    const ramp: Course = [{ fromMs: 0, toMs: 1e6, shape: { kind: 'linear', startC: 70, endC: 90 } }];
    expect(integrate(ramp, law, 0, 5e5)).toBe(0);
    expect(firstCountsMs(ramp, law, 0)).toBe(5e5);
    // From 80 to 90 °C the rate is smooth: Simpson over 20,000 steps gives the same.
    const steps = 20_000;
    const h = 5e5 / steps;
    let simpson = 0;
    for (let index = 0; index <= steps; index += 1) {
      const weight = index === 0 || index === steps ? 1 : index % 2 === 1 ? 4 : 2;
      simpson += (weight / law.fullMs(80 + (10 * index) / steps)) * (h / 3);
    }
    expect(Math.abs(integrate(ramp, law, 0, 1e6) / simpson - 1)).toBeLessThan(1e-10);
  });

  test('outside the course and backwards in time is nothing', () => {
    expect(integrate(constant(100), law, -1000, 0)).toBe(0);
    expect(integrate(constant(100), law, 500, 100)).toBe(0);
  });
});

describe('solving for a dose', () => {
  test('is exact at a constant temperature', () => {
    expect(solve(constant(100), law, 0, 1)).toBe(minutes(20));
    expect(solve(constant(100), law, 0, 0)).toBe(0);
  });

  test('says never where nothing counts, and where the course ends before', () => {
    expect(solve(constant(79), law, 0, 1)).toBeNull();
    const short: Course = [{ fromMs: 0, toMs: minutes(19), shape: { kind: 'constant', temperatureC: 100 } }];
    expect(solve(short, law, 0, 1)).toBeNull();
    expect(firstCountsMs(constant(79), law, 0)).toBeNull();
  });

  test('takes a dose that is reached exactly where a segment ends', () => {
    const short: Course = [{ fromMs: 0, toMs: minutes(20), shape: { kind: 'constant', temperatureC: 100 } }];
    expect(solve(short, law, 0, 1)).toBe(minutes(20));
  });
});
