import { dbPerNeper } from './decibels.ts';
import type { Beam, Spots } from './single-mode.ts';

/** What each cause alone would have to be for a loss in dB, 0 or more: exact inverses of the forward formulas. */

export function offsetUmForLoss(lossDb: number, { firstSpotRadiusUm, secondSpotRadiusUm }: Spots): number {
  return Math.sqrt((lossDb / dbPerNeper / 2) * (firstSpotRadiusUm ** 2 + secondSpotRadiusUm ** 2));
}

/** In radians. */
export function tiltRadForLoss(lossDb: number, { spotRadiusUm, wavelengthNm, indexBetween }: Beam): number {
  const divergenceRad = wavelengthNm / 1000 / (Math.PI * indexBetween * spotRadiusUm);
  return divergenceRad * Math.sqrt(lossDb / dbPerNeper);
}

/** Without the reflection at the two faces of the gap. */
export function gapUmForLoss(lossDb: number, { spotRadiusUm, wavelengthNm, indexBetween }: Beam): number {
  const spread = Math.sqrt(Math.expm1(lossDb / dbPerNeper));
  return (spread * 2 * Math.PI * indexBetween * spotRadiusUm ** 2) / (wavelengthNm / 1000);
}

/** How many times wider the other spot is; one as much narrower loses the same. 1 where nothing is lost. */
export function spotRatioForLoss(lossDb: number): number {
  const overlap = Math.exp(-lossDb / dbPerNeper / 2);
  return (1 + Math.sqrt(-Math.expm1(-lossDb / dbPerNeper))) / overlap;
}
