import { checkNumbers, type NumberRefusal } from '../unit/number-check.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import { radOfDeg } from './angle.ts';
import { totalLossDb } from './decibels.ts';
import { fibreRanges } from './fibre.ts';
import { gapFacesLossDb } from './fresnel.ts';
import { gapLossDb, mismatchLossDb, offsetLossDb, tiltLossDb } from './single-mode.ts';
import { spotRadiusOfModeField } from './spot.ts';

/** A joint of two single-mode fibres of one glass. A gap of 0 is contact, where the medium plays no part. */
export interface SingleModeJoint {
  readonly firstModeFieldUm: number;
  readonly secondModeFieldUm: number;
  readonly wavelengthNm: number;
  readonly glassIndex: number;
  readonly mediumIndex: number;
  readonly offsetUm: number;
  readonly tiltDeg: number;
  readonly gapUm: number;
}

export interface SingleModeLosses {
  readonly mismatchDb: number;
  readonly offsetDb: number;
  readonly tiltDb: number;
  /** Spreading in the gap. */
  readonly gapDb: number;
  /** Reflection at the two faces of the gap. */
  readonly facesDb: number;
  /** Of all, added in dB: exact in contact; with a gap, offset and tilt are taken as they act without it. */
  readonly totalDb: number;
}

const { modeFieldUm, wavelengthNm, glassIndex, mediumIndex } = fibreRanges;
const jointRanges = {
  firstModeFieldUm: modeFieldUm,
  secondModeFieldUm: modeFieldUm,
  wavelengthNm,
  glassIndex,
  mediumIndex,
  offsetUm: { lowest: 0, highest: 100 },
  tiltDeg: { lowest: 0, highest: 10 },
  gapUm: { lowest: 0, highest: 10_000 },
} as const;

export function singleModeJointLosses(
  joint: SingleModeJoint,
): Result<SingleModeLosses, NumberRefusal<keyof SingleModeJoint>> {
  const refusal = checkNumbers(joint, jointRanges);
  if (refusal) return failed(refusal);
  const isContact = joint.gapUm === 0;
  const firstSpotRadiusUm = spotRadiusOfModeField(joint.firstModeFieldUm);
  const secondSpotRadiusUm = spotRadiusOfModeField(joint.secondModeFieldUm);
  const spots = { firstSpotRadiusUm, secondSpotRadiusUm };
  const light = { wavelengthNm: joint.wavelengthNm, indexBetween: isContact ? joint.glassIndex : joint.mediumIndex };
  // The overlap of unequal Gaussians has the form of equal ones of these radii, once the mismatch is taken out.
  const meanSquare = (firstSpotRadiusUm ** 2 + secondSpotRadiusUm ** 2) / 2;
  const gapBeam = { ...light, spotRadiusUm: Math.sqrt(meanSquare) };
  const tiltBeam = { ...light, spotRadiusUm: (firstSpotRadiusUm * secondSpotRadiusUm) / Math.sqrt(meanSquare) };
  const losses = {
    mismatchDb: mismatchLossDb(spots),
    offsetDb: offsetLossDb(joint.offsetUm, spots),
    tiltDb: tiltLossDb(radOfDeg(joint.tiltDeg), tiltBeam),
    gapDb: gapLossDb(joint.gapUm, gapBeam),
    facesDb: isContact ? 0 : gapFacesLossDb(joint.glassIndex, joint.mediumIndex),
  };
  return ok({ ...losses, totalDb: totalLossDb(Object.values(losses)) });
}
