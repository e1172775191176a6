import { dbPerNeper, lossDbOfLost } from './decibels.ts';

/**
 * Reflection where glass meets another medium, by Fresnel at right angles. Always computed from the index: the often
 * quoted pair "14.7 dB, 3.5 %" is not one point. Return loss is a positive number of dB (IEC 61300-3-6).
 */

/** Share of the power that one face reflects. */
export function reflectance(glassIndex: number, mediumIndex: number): number {
  return ((glassIndex - mediumIndex) / (glassIndex + mediumIndex)) ** 2;
}

/** Of one face, such as an open end. Infinity where both indices are the same. */
export function faceReturnLossDb(glassIndex: number, mediumIndex: number): number {
  return -10 * Math.log10(reflectance(glassIndex, mediumIndex));
}

/** What the light loses that passes one face. */
export function faceLossDb(glassIndex: number, mediumIndex: number): number {
  return lossDbOfLost(reflectance(glassIndex, mediumIndex));
}

/** Of a gap, the powers of its two faces added: what a broad source shows. */
export function gapReturnLossDb(glassIndex: number, mediumIndex: number): number {
  return -10 * Math.log10(2 * reflectance(glassIndex, mediumIndex));
}

/** Of a gap whose two reflections are in step, the strongest that a narrow source can show. */
export function worstGapReturnLossDb(glassIndex: number, mediumIndex: number): number {
  const one = reflectance(glassIndex, mediumIndex);
  return -10 * Math.log10((4 * one) / (1 + one) ** 2);
}

/** What the light loses at the two faces of a gap, without the spreading in it. */
export const gapFacesLossDb = (glassIndex: number, mediumIndex: number): number =>
  2 * faceLossDb(glassIndex, mediumIndex);

/** An end polished at an angle to the fibre's axis. */
export interface AngledFace {
  readonly glassIndex: number;
  readonly mediumIndex: number;
  readonly spotRadiusUm: number;
  readonly wavelengthNm: number;
}

/** Angle in radians by which the face must lean for the reflection to leave the spot by 4.34 dB. */
const leanRad = ({ glassIndex, spotRadiusUm, wavelengthNm }: AngledFace): number =>
  wavelengthNm / 1000 / (2 * Math.PI * glassIndex * spotRadiusUm);

/**
 * Of one angled face: the reflected field leaves at twice the angle inside the glass (Gaussian tilt, from memory).
 * In theory only: scatter and the instrument's floor end a real reading of an open 8° face at 55 to 70 dB.
 */
export function angledReturnLossDb(angleRad: number, face: AngledFace): number {
  return faceReturnLossDb(face.glassIndex, face.mediumIndex) + dbPerNeper * (angleRad / leanRad(face)) ** 2;
}

/** The angle in radians that would give a return loss; null below that of a square face. */
export function angleRadForReturnLoss(returnLossDb: number, face: AngledFace): number | null {
  const gainedDb = returnLossDb - faceReturnLossDb(face.glassIndex, face.mediumIndex);
  return gainedDb < 0 ? null : leanRad(face) * Math.sqrt(gainedDb / dbPerNeper);
}
