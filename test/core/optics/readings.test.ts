import { describe, expect, test } from 'vitest';
import { lossFromReadings, takeLoss, takeReturnLoss } from '../../../src/core/optics/readings.ts';
import { refusalOf, valueOf } from './value-of.ts';

describe('a loss', () => {
  test.each([
    [0, 'usual'],
    [0.31, 'usual'],
    [10, 'usual'],
    [10.01, 'unusual'],
    [60, 'unusual'],
    [100, 'unusual'],
  ])('of %d dB is %s', (lossDb, typed) => expect(valueOf(takeLoss(lossDb))).toEqual({ lossDb, typed }));

  test.each([NaN, Infinity, -Infinity])('%d is not a number', (lossDb) => {
    expect(refusalOf(takeLoss(lossDb))).toEqual({ code: 'not a number', field: 'lossDb' });
  });

  test.each([100.1, 1e300, -101])('of %d dB cannot be', (lossDb) => {
    expect(refusalOf(takeLoss(lossDb))).toMatchObject({ code: 'out of range', field: 'lossDb', highest: 100 });
  });

  test('a gain is refused before anything is judged', () => {
    expect(refusalOf(takeLoss(-0.02))).toEqual({ code: 'reference again', lossDb: -0.02 });
  });

  test('rounding is no gain', () => {
    expect(valueOf(takeLoss(-1e-9))).toEqual({ lossDb: 0, typed: 'usual' });
  });

  test('from two readings, each inside what a meter shows', () => {
    const readings = { referencePowerDbm: -20.1, testPowerDbm: -20.4 };
    expect(valueOf(lossFromReadings(readings))).toEqual({ lossDb: 0.3, typed: 'usual' });
    for (const testPowerDbm of [NaN, -111, 41]) {
      expect(refusalOf(lossFromReadings({ ...readings, testPowerDbm }))).toMatchObject({ field: 'testPowerDbm' });
    }
  });
});

describe('a return loss', () => {
  test.each([
    [45, false],
    [-45, true],
  ])('of %d dB is stored as 45 dB', (givenDb, asReflectance) => {
    expect(valueOf(takeReturnLoss(givenDb))).toMatchObject({ returnLossDb: 45, asReflectance, typed: 'usual' });
  });

  test('zero has no sign', () => {
    expect(Object.is(valueOf(takeReturnLoss(-0)).returnLossDb, 0)).toBe(true);
  });

  test.each([
    [75, false],
    [75.1, true],
    [-80, true],
  ])('of %d dB at the instrument floor: %s (common practice, no source)', (givenDb, atInstrumentFloor) => {
    expect(valueOf(takeReturnLoss(givenDb)).atInstrumentFloor).toBe(atInstrumentFloor);
  });

  test.each([NaN, Infinity, 121, -121])('of %d dB is refused', (givenDb) => {
    expect(refusalOf(takeReturnLoss(givenDb)).field).toBe('returnLossDb');
  });
});
