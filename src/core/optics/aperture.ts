import { degOfRad } from './angle.ts';

/** Of a step-index fibre. NaN where the cladding is denser than the core. */
export function numericalAperture(coreIndex: number, claddingIndex: number): number {
  return Math.sqrt(coreIndex ** 2 - claddingIndex ** 2);
}

/** From the relative difference of index, which the textbooks call Δ. */
export function apertureOfDifference(coreIndex: number, relativeDifference: number): number {
  return coreIndex * Math.sqrt(2 * relativeDifference);
}

/** Half of the cone, in air, that the fibre takes in. */
export const acceptanceHalfAngleDeg = (numericalAperture: number): number => degOfRad(Math.asin(numericalAperture));

/** Against the normal of the wall between core and cladding. */
export const criticalAngleDeg = (coreIndex: number, claddingIndex: number): number =>
  degOfRad(Math.asin(claddingIndex / coreIndex));
