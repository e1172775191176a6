import { lossDbOfLost, lossDbOfShare } from './decibels.ts';

/**
 * Losses in dB of a joint of two multimode fibres whose modes are filled evenly, each cause alone and without the
 * reflection at a gap. Sources: Senior, Optical Fiber Communications, ch. 5; the graded profile is parabolic.
 */

/** Share of the light that passes a lateral offset of two equal step-index cores; 0 from one diameter on. */
function overlap(offsetUm: number, coreRadiusUm: number): number {
  const halfAngleRad = Math.acos(Math.min(1, offsetUm / (2 * coreRadiusUm)));
  return (2 * halfAngleRad - Math.sin(2 * halfAngleRad)) / Math.PI;
}

export function stepOffsetLossDb(offsetUm: number, coreRadiusUm: number): number {
  return lossDbOfShare(overlap(offsetUm, coreRadiusUm));
}

/** Share lost per offset over core radius: with the guided modes alone, or with the leaky ones too. */
export const gradedLossFactor = { guided: 0.85, 'guided and leaky': 0.75 } as const;
export type GradedModes = keyof typeof gradedLossFactor;

/** Up to here, in core radii, the graded formula holds. */
export const largestGradedOffset = 0.2;

export function gradedOffsetLossDb(offsetUm: number, coreRadiusUm: number, modes: GradedModes): number {
  return lossDbOfLost((gradedLossFactor[modes] * offsetUm) / coreRadiusUm);
}

/** Tilt in radians; the formula holds while the tilt stays inside the cone that the fibre takes in. */
export function angularLossDb(tiltRad: number, indexBetween: number, numericalAperture: number): number {
  return lossDbOfLost((indexBetween * tiltRad) / (Math.PI * numericalAperture));
}

/** The largest tilt in radians for which the angular formula is used. */
export const largestTiltRad = (indexBetween: number, numericalAperture: number): number =>
  numericalAperture / indexBetween;

/** From a wide core into a narrow one; nothing the other way. */
export function coreMismatchLossDb(fromCoreUm: number, toCoreUm: number): number {
  return toCoreUm < fromCoreUm ? 20 * Math.log10(fromCoreUm / toCoreUm) : 0;
}

/** From a wide cone into a narrow one; nothing the other way. */
export function apertureMismatchLossDb(fromNumericalAperture: number, toNumericalAperture: number): number {
  const isNarrower = toNumericalAperture < fromNumericalAperture;
  return isNarrower ? 20 * Math.log10(fromNumericalAperture / toNumericalAperture) : 0;
}
