import { describe, expect, test } from 'vitest';
import type { Course } from '../../src/core/cure/course.ts';
import { lawFromRate } from '../../src/core/cure/dose-law.ts';
import { integrate } from '../../src/core/cure/dose.ts';

// Equivalent age of concrete after ASTM C1074: te = SUM exp(-Q (1/Ta - 1/Tr)) dt (formula as in its openings and
// Carino 1984; Q = 5000 K from memory, kelvin = C + 273). No published example could be opened, so the factors and
// profiles below are computed from the stated formulas (this project's facts, section 7.1).
const hourMs = 3_600_000;
const kelvin = (temperatureC: number) => temperatureC + 273;
const equivalentAge = (referenceC: number) =>
  lawFromRate((temperatureC) => Math.exp(-5000 * (1 / kelvin(temperatureC) - 1 / kelvin(referenceC))) / hourMs);
/** Eurocode 2, Annex B, from memory. */
const eurocode = lawFromRate((temperatureC) => Math.exp(13.65 - 4000 / kelvin(temperatureC)) / hourMs);
/** Nurse-Saul maturity in °C h above a datum, clipped at 0 below it. */
const nurseSaul = (datumC: number) =>
  lawFromRate((temperatureC) => Math.max(0, temperatureC - datumC) / hourMs, [datumC]);

const hold = (temperatureC: number): Course => [{ fromMs: 0, toMs: hourMs, shape: { kind: 'constant', temperatureC } }];

const temperaturesC = [5, 10, 15, 20, 23, 30, 40, 50, 60];
describe.each([
  { referenceC: 23, factors: [0.335, 0.4603, 0.6255, 0.8412, 1, 1.4773, 2.5029, 4.1042, 6.5331] },
  { referenceC: 20, factors: [0.3982, 0.5472, 0.7436, 1, 1.1888, 1.7563, 2.9755, 4.8791, 7.7666] },
])('an hour, in hours at $referenceC °C', ({ referenceC, factors }) => {
  test.each(temperaturesC.map((temperatureC, index) => ({ temperatureC, factor: factors[index] ?? NaN })))(
    'at $temperatureC °C is $factor',
    ({ temperatureC, factor }) => {
      expect(integrate(hold(temperatureC), equivalentAge(referenceC), 0, hourMs)).toBeCloseTo(factor, 4);
    },
  );
});

test.each([
  { temperatureC: 10, factor: 0.6161 },
  { temperatureC: 20, factor: 0.9981 },
  { temperatureC: 30, factor: 1.5662 },
  { temperatureC: 40, factor: 2.388 },
  { temperatureC: 60, factor: 5.1448 },
])('an hour at $temperatureC °C is $factor h by Eurocode 2', ({ temperatureC, factor }) => {
  expect(integrate(hold(temperatureC), eurocode, 0, hourMs)).toBeCloseTo(factor, 4);
});

describe('6 h at 20 °C, 6 h at 40 °C, 12 h at 10 °C', () => {
  const profile: Course = [
    { fromMs: 0, toMs: 6 * hourMs, shape: { kind: 'constant', temperatureC: 20 } },
    { fromMs: 6 * hourMs, toMs: 12 * hourMs, shape: { kind: 'constant', temperatureC: 40 } },
    { fromMs: 12 * hourMs, toMs: 24 * hourMs, shape: { kind: 'constant', temperatureC: 10 } },
  ];
  test.each([
    { law: equivalentAge(23), name: 'equivalent age at 23 °C', worth: 25.588, digits: 3 },
    { law: equivalentAge(20), name: 'equivalent age at 20 °C', worth: 30.419, digits: 3 },
    { law: eurocode, name: 'Eurocode 2', worth: 27.71, digits: 3 },
    { law: nurseSaul(0), name: 'Nurse-Saul, datum 0 °C', worth: 480, digits: 9 },
    { law: nurseSaul(-10), name: 'Nurse-Saul, datum -10 °C', worth: 720, digits: 9 },
  ])('$name: $worth', ({ law, worth, digits }) => {
    expect(integrate(profile, law, 0, 24 * hourMs)).toBeCloseTo(worth, digits);
  });
});
