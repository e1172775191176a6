import { describe, expect, test } from 'vitest';
import { radOfDeg } from '../../src/core/optics/angle.ts';
import { gapLossDb, mismatchLossDb, offsetLossDb, tiltLossDb } from '../../src/core/optics/single-mode.ts';

/** Computed apart from this code from the formulas of Marcuse 1977 and Ghatak and Thyagarajan, eq. 8.69, 8.75, 8.81. */
describe('single-mode at 1310 nm, mode field 9.2 µm (computed)', () => {
  const spots = { firstSpotRadiusUm: 4.6, secondSpotRadiusUm: 4.6 };
  const beam = { spotRadiusUm: 4.6, wavelengthNm: 1310 };

  test.each([
    [0.25, 0.0128],
    [0.5, 0.0513],
    [1, 0.2052],
    [1.5, 0.4618],
    [2, 0.821],
    [3, 1.8472],
  ])('%d µm off: %d dB', (offsetUm, lossDb) => expect(offsetLossDb(offsetUm, spots)).toBeCloseTo(lossDb, 4));

  test.each([
    [0.1, 0.0035],
    [0.2, 0.0139],
    [0.3, 0.0312],
    [0.5, 0.0867],
    [1, 0.3469],
  ])('tilted by %d° in glass of index 1.468: %d dB', (tiltDeg, lossDb) =>
    expect(tiltLossDb(radOfDeg(tiltDeg), { ...beam, indexBetween: 1.468 })).toBeCloseTo(lossDb, 4),
  );

  test.each([
    [1, 0.0004],
    [5, 0.0105],
    [10, 0.042],
    [20, 0.1655],
    [50, 0.9437],
    [100, 2.9465],
  ])('an air gap of %d µm, without its reflection: %d dB', (gapUm, lossDb) =>
    expect(gapLossDb(gapUm, { ...beam, indexBetween: 1 })).toBeCloseTo(lossDb, 4),
  );

  test.each([
    [8.6, 9.5, 0.043],
    [8.2, 9.2, 0.0574],
    [9, 9.2, 0.0021],
    [9.2, 10.4, 0.0651],
  ])('mode fields of %d and %d µm: %d dB', (firstUm, secondUm, lossDb) =>
    expect(mismatchLossDb({ firstSpotRadiusUm: firstUm / 2, secondSpotRadiusUm: secondUm / 2 })).toBeCloseTo(lossDb, 4),
  );
});
