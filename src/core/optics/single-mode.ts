import { dbPerNeper } from './decibels.ts';

/**
 * Losses in dB of a joint of two single-mode fibres whose fields are Gaussian, each cause alone. Radii of spots are
 * 1/e radii of the field; angles are small. Sources: Marcuse 1977; Ghatak and Thyagarajan, eq. 8.69, 8.75, 8.81.
 * The causes add in dB where there is no gap: then offset and tilt act on separate factors of the overlap.
 */

export interface Spots {
  readonly firstSpotRadiusUm: number;
  readonly secondSpotRadiusUm: number;
}

/** Light of one wavelength in vacuum, between two equal fibres with a medium of this index between them. */
export interface Beam {
  readonly spotRadiusUm: number;
  readonly wavelengthNm: number;
  readonly indexBetween: number;
}

/** Mode fields of two sizes, well aligned. */
export function mismatchLossDb({ firstSpotRadiusUm: first, secondSpotRadiusUm: second }: Spots): number {
  const ratio = second / first;
  return -2 * dbPerNeper * Math.log1p(-((ratio - 1) ** 2) / (1 + ratio ** 2)) + 0;
}

/** Lateral offset alone, without the mismatch of the two spots. */
export function offsetLossDb(offsetUm: number, { firstSpotRadiusUm, secondSpotRadiusUm }: Spots): number {
  return (dbPerNeper * 2 * offsetUm ** 2) / (firstSpotRadiusUm ** 2 + secondSpotRadiusUm ** 2);
}

/** Tilt of one axis against the other, in radians. In contact the index between is that of the glass. */
export function tiltLossDb(tiltRad: number, { spotRadiusUm, wavelengthNm, indexBetween }: Beam): number {
  const divergenceRad = wavelengthNm / 1000 / (Math.PI * indexBetween * spotRadiusUm);
  return dbPerNeper * (tiltRad / divergenceRad) ** 2;
}

/** Spreading of the light in a gap alone, without the reflection at its two faces. */
export function gapLossDb(gapUm: number, { spotRadiusUm, wavelengthNm, indexBetween }: Beam): number {
  const spread = (gapUm * wavelengthNm) / 1000 / (2 * Math.PI * indexBetween * spotRadiusUm ** 2);
  return dbPerNeper * Math.log1p(spread ** 2);
}
