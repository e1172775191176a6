import { describe, expect, test } from 'vitest';
import { radOfDeg } from '../../src/core/optics/angle.ts';
import { apertureOfDifference } from '../../src/core/optics/aperture.ts';
import { faceLossDb, gapFacesLossDb, reflectance } from '../../src/core/optics/fresnel.ts';
import { angularLossDb, stepOffsetLossDb } from '../../src/core/optics/multimode.ts';
import { offsetLossDb, tiltLossDb } from '../../src/core/optics/single-mode.ts';
import { spotRadiusOfModeField, spotRadiusUm } from '../../src/core/optics/spot.ts';

/** FOSSEE Scilab textbook companion 1655, chapter 5; figures as programmed there, the book's own where it differs. */
describe('textbook companion 1655, chapter 5', () => {
  test('example 5.2.1: index 1.47 in air reflects 0.036; both faces lose 0.320 dB (book: 0.318)', () => {
    expect(reflectance(1.47, 1)).toBeCloseTo(0.036, 3);
    expect(gapFacesLossDb(1.47, 1)).toBeCloseTo(0.32, 3);
  });

  test('example 5.2.2: core 40 µm, 4 µm off, index 1.47: 0.91 dB with an air gap, 0.59 dB without', () => {
    expect(stepOffsetLossDb(4, 20) + gapFacesLossDb(1.47, 1)).toBeCloseTo(0.9107, 4);
    expect(stepOffsetLossDb(4, 20)).toBeCloseTo(0.5904, 4);
  });

  test.each([
    [0.3, 1.22],
    [0.6, 0.75],
  ])('example 5.2.3: index 1.48, 10° in air, numerical aperture %d: %d dB', (numericalAperture, lossDb) => {
    expect(angularLossDb(radOfDeg(10), 1, numericalAperture) + gapFacesLossDb(1.48, 1)).toBeCloseTo(lossDb, 2);
  });

  test('example 5.2.4: index 1.5 in air reflects 0.04; both faces lose 0.35 dB (book: 0.36)', () => {
    expect(reflectance(1.5, 1)).toBeCloseTo(0.04, 12);
    expect(2 * faceLossDb(1.5, 1)).toBeCloseTo(0.3546, 4);
  });

  test('example 5.2.5: core 50 µm, 5 µm off, index 1.5: 0.94 dB (book: 0.95) with an air gap, 0.59 dB without', () => {
    expect(stepOffsetLossDb(5, 25) + gapFacesLossDb(1.5, 1)).toBeCloseTo(0.945, 3);
    expect(stepOffsetLossDb(5, 25)).toBeCloseTo(0.5904, 4);
  });

  test('example 5.2.6: core 80 µm, 2 µm off, 3°, index 1.47, difference 2 %: 0.46 + 0.57 = 1.03 dB (book: 0.48, 1.05)', () => {
    // The example counts the reflection of the gap with each cause, so twice.
    const facesDb = gapFacesLossDb(1.47, 1);
    const offsetDb = stepOffsetLossDb(2, 40) + facesDb;
    const tiltDb = angularLossDb(radOfDeg(3), 1, apertureOfDifference(1.47, 0.02)) + facesDb;
    expect(offsetDb).toBeCloseTo(0.4608, 4);
    expect(tiltDb).toBeCloseTo(0.5738, 4);
    expect(offsetDb + tiltDb).toBeCloseTo(1.0346, 4);
  });

  test('example 5.4.1: spot radius 4.95 µm, 1 µm off: exp(-(d/w)²), 0.1772 dB', () => {
    expect(offsetLossDb(1, { firstSpotRadiusUm: 4.95, secondSpotRadiusUm: 4.95 })).toBeCloseTo(0.1772, 4);
  });

  test('example 5.4.2: spot radius 4.95 µm, 1.3 µm, index 1.465, 1°: exp(-(πnwθ/λ)²), 0.4063 dB', () => {
    const beam = { spotRadiusUm: 4.95, wavelengthNm: 1300, indexBetween: 1.465 };
    expect(tiltLossDb(radOfDeg(1), beam)).toBeCloseTo(0.4063, 4);
  });

  test('4.95 µm is called a mode-field diameter there and used as a radius: core radius 4.5 µm, V 2.40', () => {
    expect(spotRadiusUm(4.5, 2.4)).toBeCloseTo(4.952, 3);
    const asDiameter = spotRadiusOfModeField(4.95);
    const wrong = offsetLossDb(1, { firstSpotRadiusUm: asDiameter, secondSpotRadiusUm: asDiameter });
    expect(wrong / 0.1772).toBeCloseTo(4, 1);
  });
});
