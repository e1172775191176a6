import { describe, expect, test } from 'vitest';
import { radOfDeg } from '../../src/core/optics/angle.ts';
import { acceptanceHalfAngleDeg, criticalAngleDeg, numericalAperture } from '../../src/core/optics/aperture.ts';
import { lossDbOfShare, shareOfLossDb } from '../../src/core/optics/decibels.ts';
import {
  angledReturnLossDb,
  faceLossDb,
  faceReturnLossDb,
  gapFacesLossDb,
  gapReturnLossDb,
  reflectance,
  worstGapReturnLossDb,
} from '../../src/core/optics/fresnel.ts';

describe('Fresnel reflection of glass in air (computed from R = ((n1 - n) / (n1 + n))²)', () => {
  test.each([
    [1.45, 3.374, 14.72, 0.149, 0.298, 11.71, 8.99],
    [1.46, 3.497, 14.56, 0.155, 0.309, 11.55, 8.84],
    [1.468, 3.598, 14.44, 0.159, 0.318, 11.43, 8.73],
    [1.47, 3.621, 14.41, 0.16, 0.32, 11.4, 8.7],
    [1.48, 3.746, 14.26, 0.166, 0.332, 11.25, 8.56],
    [1.5, 4, 13.98, 0.177, 0.355, 10.97, 8.3],
  ])('index %d: %d %%, %d dB one face, loses %d and %d dB, gap %d dB, worst %d dB', (...row) => {
    const [index, percent, faceDb, oneDb, twoDb, gapDb, worstDb] = row;
    expect(100 * reflectance(index, 1)).toBeCloseTo(percent, 2);
    expect(faceReturnLossDb(index, 1)).toBeCloseTo(faceDb, 2);
    expect(faceLossDb(index, 1)).toBeCloseTo(oneDb, 3);
    expect(gapFacesLossDb(index, 1)).toBeCloseTo(twoDb, 3);
    expect(gapReturnLossDb(index, 1)).toBeCloseTo(gapDb, 2);
    expect(worstGapReturnLossDb(index, 1)).toBeCloseTo(worstDb, 2);
  });

  test('"14.7 dB, 3.5 %" is not one point: 14.7 dB is 3.39 %, 3.5 % is 14.56 dB', () => {
    expect(100 * shareOfLossDb(14.7)).toBeCloseTo(3.39, 2);
    expect(lossDbOfShare(0.035)).toBeCloseTo(14.56, 2);
  });

  test('nothing is reflected where there is no step of index', () => {
    expect(reflectance(1.468, 1.468)).toBe(0);
    expect(faceReturnLossDb(1.468, 1.468)).toBe(Infinity);
    expect(gapFacesLossDb(1.468, 1.468)).toBe(0);
  });
});

describe('return loss of an open angled face, index 1.468 (Gaussian tilt, formula from memory; computed)', () => {
  test.each([
    [1310, 4.6, [14.4, 15.8, 20, 36.6, 64.4, 103.3]],
    [1550, 5.2, [14.4, 15.7, 19.5, 34.7, 60, 95.5]],
  ])('%d nm, spot radius %d µm', (wavelengthNm, spotRadiusUm, expectedDb) => {
    const face = { glassIndex: 1.468, mediumIndex: 1, spotRadiusUm, wavelengthNm };
    for (const [index, angleDeg] of [0, 1, 2, 4, 6, 8].entries()) {
      expect(angledReturnLossDb(radOfDeg(angleDeg), face)).toBeCloseTo(expectedDb[index]!, 1);
    }
  });
});

describe('aperture and decibels', () => {
  test('core 1.50, cladding 1.47: NA 0.2985, half-angle 17.37°, critical angle 78.52° (computed; textbook 0.30, 17.4, 78.5 from memory)', () => {
    expect(numericalAperture(1.5, 1.47)).toBeCloseTo(0.2985, 4);
    expect(acceptanceHalfAngleDeg(numericalAperture(1.5, 1.47))).toBeCloseTo(17.37, 2);
    expect(criticalAngleDeg(1.5, 1.47)).toBeCloseTo(78.52, 2);
  });

  test.each([
    [0.14, 8.05],
    [0.2, 11.54],
    [0.275, 15.96],
  ])('NA %d: half-angle %d° (computed)', (aperture, deg) =>
    expect(acceptanceHalfAngleDeg(aperture)).toBeCloseTo(deg, 2),
  );

  test.each([
    [0.25, 94.41],
    [0.5, 89.13],
    [0.75, 84.14],
    [1, 79.43],
    [3.0103, 50],
    [20, 1],
    [30, 0.1],
  ])('%d dB lets %d %% through (computed)', (lossDb, percent) =>
    expect(100 * shareOfLossDb(lossDb)).toBeCloseTo(percent, 2),
  );
});
