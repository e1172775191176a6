import { describe, expect, test } from 'vitest';
import { radOfDeg } from '../../src/core/optics/angle.ts';
import { apertureOfDifference } from '../../src/core/optics/aperture.ts';
import { lossDbOfLost } from '../../src/core/optics/decibels.ts';
import { faceLossDb, gapFacesLossDb, reflectance } from '../../src/core/optics/fresnel.ts';
import {
  angularLossDb,
  apertureMismatchLossDb,
  gradedOffsetLossDb,
  stepOffsetLossDb,
} from '../../src/core/optics/multimode.ts';

/** Raina, chapter 7, as programmed in a public textbook companion. */
describe('Raina, chapter 7', () => {
  test('example 7.1: index 1.46 in air; with the reflectance cut to 0.03 a face loses 0.132 dB, exactly 0.155 dB', () => {
    expect(reflectance(1.46, 1)).toBeCloseTo(0.035, 3);
    expect(lossDbOfLost(0.03)).toBeCloseTo(0.1323, 4);
    expect(faceLossDb(1.46, 1)).toBeCloseTo(0.1546, 4);
  });

  test('example 7.2: core 50 µm, 3 µm off, index 1.46: 0.65 dB with an air gap, 0.34 dB without', () => {
    expect(stepOffsetLossDb(3, 25) + gapFacesLossDb(1.46, 1)).toBeCloseTo(0.6541, 4);
    expect(stepOffsetLossDb(3, 25)).toBeCloseTo(0.3449, 4);
  });

  test('example 7.3: core 50 µm, 4 µm off with an air gap, 4°, index 1.5, difference 2 %: 0.82 + 0.33 = 1.15 dB', () => {
    const offsetDb = stepOffsetLossDb(4, 25) + gapFacesLossDb(1.5, 1);
    // The program rounds 4° to 0.069 rad and π to 3.14, and counts the gap once.
    const tiltDb = angularLossDb(radOfDeg(4), 1, apertureOfDifference(1.5, 0.02));
    expect(offsetDb).toBeCloseTo(0.8206, 4);
    expect(tiltDb).toBeCloseTo(0.33, 2);
    expect(Math.abs(offsetDb + tiltDb - 1.151)).toBeLessThan(0.005);
  });

  test('example 7.10: graded index, 5 µm off a core radius of 25 µm: 0.809 dB guided, 0.706 dB with leaky modes', () => {
    expect(gradedOffsetLossDb(5, 25, 'guided')).toBeCloseTo(0.8092, 4);
    expect(gradedOffsetLossDb(5, 25, 'guided and leaky')).toBeCloseTo(0.7058, 4);
  });

  test('example 7.14: index 1.48, both faces lose 0.332 dB', () => {
    expect(gapFacesLossDb(1.48, 1)).toBeCloseTo(0.3316, 4);
  });

  test('example 7.15: numerical aperture 0.32 into 0.22 loses 3.25 dB', () => {
    expect(apertureMismatchLossDb(0.32, 0.22)).toBeCloseTo(3.2545, 4);
    expect(apertureMismatchLossDb(0.22, 0.32)).toBe(0);
  });
});
