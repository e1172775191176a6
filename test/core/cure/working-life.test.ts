import { expect, test } from 'vitest';
import { workingLifeSeconds } from '../../../src/core/cure/working-life.ts';

const stated = { workingLifeMinutes: 60, workingLifeAtC: 23, workingLifeActivationKJPerMol: 60 };

test('the stated life at the stated temperature, and where the room was not measured', () => {
  expect(workingLifeSeconds(stated, 23)).toBe(3600);
  expect(workingLifeSeconds(stated, null)).toBe(3600);
});

test('a warmer room shortens it by Arrhenius', () => {
  // 3600 s / exp(60000 / 8.314463 x (1/296.15 - 1/303.15)) = 2050.89 s, reckoned apart from this code.
  expect(workingLifeSeconds(stated, 30)).toBe(2050);
});

test('a colder room lengthens nothing', () => {
  expect(workingLifeSeconds(stated, 12)).toBe(3600);
});

test('far outside the range of rooms it stays on the careful side', () => {
  expect(workingLifeSeconds(stated, -20)).toBe(3600);
  expect(workingLifeSeconds(stated, 60)).toBeLessThan(workingLifeSeconds(stated, 40));
});

test('without an activation energy the life is fixed', () => {
  expect(workingLifeSeconds({ ...stated, workingLifeActivationKJPerMol: null }, 35)).toBe(3600);
});
