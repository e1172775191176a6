import { describe, expect, test } from 'vitest';
import { radOfDeg } from '../../src/core/optics/angle.ts';
import { totalLossDb } from '../../src/core/optics/decibels.ts';
import { gapFacesLossDb } from '../../src/core/optics/fresnel.ts';
import { gradedOffsetLossDb, stepOffsetLossDb } from '../../src/core/optics/multimode.ts';
import { multimodeJointLosses } from '../../src/core/optics/multimode-joint-losses.ts';
import { mismatchLossDb, offsetLossDb, tiltLossDb } from '../../src/core/optics/single-mode.ts';
import { spotRadiusUm } from '../../src/core/optics/spot.ts';
import { valueOf } from '../core/optics/value-of.ts';

/** J. M. Senior, Optical Fiber Communications, chapter 5, examples as worked there; last digits are the book's. */
describe('Senior, Optical Fiber Communications, chapter 5', () => {
  test('example 5.1: two faces of glass of index 1.5 in air lose 0.35 dB', () => {
    expect(gapFacesLossDb(1.5, 1)).toBeCloseTo(0.3546, 4);
    expect(Math.abs(gapFacesLossDb(1.5, 1) - 0.35)).toBeLessThan(0.005);
  });

  test('example 5.2: step index, core 50 µm, 5 µm off: 0.95 dB (0.945) with an air gap, 0.59 dB matched', () => {
    const matched = stepOffsetLossDb(5, 25);
    expect(matched).toBeCloseTo(0.5904, 4);
    expect(matched + gapFacesLossDb(1.5, 1)).toBeCloseTo(0.945, 3);
  });

  test('example 5.3: graded index, core 50 µm, 3 µm off: 0.47 dB guided, 0.41 dB with leaky modes', () => {
    expect(gradedOffsetLossDb(3, 25, 'guided')).toBeCloseTo(0.467, 3);
    expect(gradedOffsetLossDb(3, 25, 'guided and leaky')).toBeCloseTo(0.41, 2);
  });

  test.each([
    [0.2, 0.98],
    [0.4, 0.64],
  ])('example 5.4: index 1.48, 5° in air, numerical aperture %d: %d dB', (numericalAperture, lossDb) => {
    const profile = { kind: 'step' } as const;
    const fibre = { kind: 'multimode', coreUm: 50, numericalAperture, glassIndex: 1.48, profile } as const;
    const between = { kind: 'gap', mediumIndex: 1 } as const;
    const losses = valueOf(multimodeJointLosses({ fibre, between, offsetUm: 0, tiltDeg: 5 }));
    expect(losses.totalDb).toBeCloseTo(lossDb, 2);
  });

  test('example 5.5: V 2.40, core radius 4 µm, NA 0.1, index 1.46, 1 µm off, 1° tilt: 0.72 dB', () => {
    const spot = spotRadiusUm(4, 2.4);
    // The book's own spot radius is smaller by √2: 3.12 µm.
    expect(spot / Math.SQRT2).toBeCloseTo(3.11, 2);
    const wavelengthNm = (2 * Math.PI * 4 * 0.1 * 1000) / 2.4;
    const offset = offsetLossDb(1, { firstSpotRadiusUm: spot, secondSpotRadiusUm: spot });
    const tilt = tiltLossDb(radOfDeg(1), { spotRadiusUm: spot, wavelengthNm, indexBetween: 1.46 });
    expect(offset).toBeCloseTo(0.22, 2);
    expect(tilt).toBeCloseTo(0.49, 2);
    expect(totalLossDb([offset, tilt])).toBeCloseTo(0.72, 2);
  });

  test('example 5.6: mode-field radii of 5.6 and 4.2 µm: 0.35 dB (0.3546)', () => {
    const loss = mismatchLossDb({ firstSpotRadiusUm: 5.6, secondSpotRadiusUm: 4.2 });
    expect(loss).toBeCloseTo(0.3546, 4);
    expect(mismatchLossDb({ firstSpotRadiusUm: 4.2, secondSpotRadiusUm: 5.6 })).toBeCloseTo(loss, 12);
  });
});
