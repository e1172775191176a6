import { expect, test } from 'vitest';
import { extremesC, passesAtMs, temperatureAtC, type Course } from '../../../src/core/cure/course.ts';

const course: Course = [
  { fromMs: 0, toMs: 1000, shape: { kind: 'constant', temperatureC: 20 } },
  { fromMs: 1000, toMs: 2000, shape: { kind: 'linear', startC: 20, endC: 120 } },
  { fromMs: 2000, toMs: Infinity, shape: { kind: 'lag', startC: 100, towardC: 50, constantMs: 1000 } },
];

test('temperature at a time; a segment holds its start but not its end', () => {
  expect(temperatureAtC(course, 999)).toBe(20);
  expect(temperatureAtC(course, 1500)).toBe(70);
  expect(temperatureAtC(course, 2000)).toBe(100);
  expect(temperatureAtC(course, 3000)).toBeCloseTo(50 + 50 / Math.E, 12);
  expect(temperatureAtC(course, -1)).toBeNull();
});

test('when a segment passes a temperature', () => {
  const [, ramp, lag] = course;
  if (!ramp || !lag) throw new Error('course is too short');
  expect(passesAtMs(ramp, 95)).toBe(1750);
  expect(passesAtMs(ramp, 121)).toBeNull();
  expect(passesAtMs(lag, 75)).toBeCloseTo(2000 + 1000 * Math.LN2, 9);
  expect(passesAtMs(lag, 49)).toBeNull();
});

test('coldest and hottest look at jumps and at the part asked for', () => {
  expect(extremesC(course, 0, 1750)).toEqual({ coldestC: 20, hottestC: 95 });
  expect(extremesC(course, 1500, 2000)).toEqual({ coldestC: 70, hottestC: 120 });
  expect(extremesC(course, -20, -10)).toBeNull();
});
