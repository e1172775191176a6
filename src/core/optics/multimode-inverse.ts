import { isAtMost } from '../unit/decimal.ts';
import { lostOfLossDb } from './decibels.ts';
import {
  gradedLossFactor,
  largestGradedOffset,
  largestTiltRad,
  stepOffsetLossDb,
  type GradedModes,
} from './multimode.ts';

/** What each cause alone would have to be for a loss in dB; null where the formula does not reach that far. */

/** Halvings that use up the digits of a double. */
const halvings = 60;

export function stepOffsetUmForLoss(lossDb: number, coreRadiusUm: number): number {
  let lowUm = 0;
  let highUm = 2 * coreRadiusUm;
  for (let step = 0; step < halvings; step += 1) {
    const middleUm = (lowUm + highUm) / 2;
    if (stepOffsetLossDb(middleUm, coreRadiusUm) < lossDb) lowUm = middleUm;
    else highUm = middleUm;
  }
  return highUm;
}

export function gradedOffsetUmForLoss(lossDb: number, coreRadiusUm: number, modes: GradedModes): number | null {
  const offset = lostOfLossDb(lossDb) / gradedLossFactor[modes];
  return isAtMost(offset, largestGradedOffset) ? offset * coreRadiusUm : null;
}

/** In radians. */
export function tiltRadForAngularLoss(lossDb: number, indexBetween: number, numericalAperture: number): number | null {
  const tiltRad = (lostOfLossDb(lossDb) * Math.PI * numericalAperture) / indexBetween;
  return isAtMost(tiltRad, largestTiltRad(indexBetween, numericalAperture)) ? tiltRad : null;
}

/** The core, narrower than the one before it, that would lose as much. */
export const narrowerCoreUmForLoss = (lossDb: number, coreUm: number): number => coreUm * 10 ** (-lossDb / 20);
