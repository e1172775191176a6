import { isAtMost } from '../unit/decimal.ts';
import { checkNumbers, type NumberRefusal } from '../unit/number-check.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import { degOfRad, radOfDeg } from './angle.ts';
import { totalLossDb } from './decibels.ts';
import { fibreRanges, type Between, type MultimodeFibre, type Profile } from './fibre.ts';
import { gapFacesLossDb } from './fresnel.ts';
import {
  angularLossDb,
  gradedOffsetLossDb,
  largestGradedOffset,
  largestTiltRad,
  stepOffsetLossDb,
} from './multimode.ts';

export interface MultimodeJoint {
  readonly fibre: MultimodeFibre;
  readonly between: Between;
  readonly offsetUm: number;
  readonly tiltDeg: number;
}

export interface MultimodeLosses {
  /** Infinity where step-index cores no longer overlap. */
  readonly offsetDb: number;
  readonly tiltDb: number;
  /** Reflection at the two faces of a gap, counted once. */
  readonly facesDb: number;
  readonly totalDb: number;
}

export type MultimodeField = 'coreUm' | 'numericalAperture' | 'glassIndex' | 'mediumIndex' | 'offsetUm' | 'tiltDeg';

const { coreUm, numericalAperture, glassIndex, mediumIndex } = fibreRanges;
const ranges = {
  coreUm,
  numericalAperture,
  glassIndex,
  mediumIndex,
  offsetUm: { lowest: 0, highest: 1000 },
  tiltDeg: { lowest: 0, highest: 40 },
} as const;

/** The medium's index; in contact that of the glass. */
export function indexBetween(between: Between, glassIndex: number): number {
  return between.kind === 'contact' ? glassIndex : between.mediumIndex;
}

/** Of a gap its two faces; nothing in contact. */
export function facesLossDb(between: Between, glassIndex: number): number {
  return between.kind === 'contact' ? 0 : gapFacesLossDb(glassIndex, between.mediumIndex);
}

export function multimodeJointLosses(joint: MultimodeJoint): Result<MultimodeLosses, NumberRefusal<MultimodeField>> {
  const { fibre, between, offsetUm, tiltDeg } = joint;
  const medium = indexBetween(between, fibre.glassIndex);
  const { coreUm, numericalAperture, glassIndex } = fibre;
  const values = { coreUm, numericalAperture, glassIndex, mediumIndex: medium, offsetUm, tiltDeg };
  const refusal = checkNumbers(values, ranges) ?? pastFormula(joint, medium);
  if (refusal) return failed(refusal);
  const losses = {
    offsetDb: offsetLossDb(offsetUm, coreUm / 2, fibre.profile),
    tiltDb: angularLossDb(radOfDeg(tiltDeg), medium, numericalAperture),
    facesDb: facesLossDb(between, glassIndex),
  };
  return ok({ ...losses, totalDb: totalLossDb(Object.values(losses)) });
}

function offsetLossDb(offsetUm: number, coreRadiusUm: number, profile: Profile): number {
  return profile.kind === 'step'
    ? stepOffsetLossDb(offsetUm, coreRadiusUm)
    : gradedOffsetLossDb(offsetUm, coreRadiusUm, profile.modes);
}

/** Past these the formulas mean nothing; that for step-index cores holds everywhere. */
function pastFormula(
  { fibre, offsetUm, tiltDeg }: MultimodeJoint,
  mediumIndex: number,
): NumberRefusal<MultimodeField> | null {
  const { coreUm, numericalAperture, profile } = fibre;
  const largestOffsetUm = profile.kind === 'step' ? Infinity : (largestGradedOffset * coreUm) / 2;
  const largestTiltDeg = degOfRad(largestTiltRad(mediumIndex, numericalAperture));
  if (!isAtMost(offsetUm, largestOffsetUm)) {
    return { code: 'out of range', field: 'offsetUm', found: offsetUm, lowest: 0, highest: largestOffsetUm };
  }
  if (!isAtMost(tiltDeg, largestTiltDeg)) {
    return { code: 'out of range', field: 'tiltDeg', found: tiltDeg, lowest: 0, highest: largestTiltDeg };
  }
  return null;
}
