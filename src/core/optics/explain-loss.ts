import { isAtLeast } from '../unit/decimal.ts';
import { checkNumber, checkNumbers, type NumberRefusal } from '../unit/number-check.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import { degOfRad } from './angle.ts';
import { fibreRanges, type MultimodeFibre, type SingleModeFibre } from './fibre.ts';
import { gapFacesLossDb } from './fresnel.ts';
import {
  gradedOffsetUmForLoss,
  narrowerCoreUmForLoss,
  stepOffsetUmForLoss,
  tiltRadForAngularLoss,
} from './multimode-inverse.ts';
import { gapUmForLoss, offsetUmForLoss, spotRatioForLoss, tiltRadForLoss } from './single-mode-inverse.ts';
import { spotRadiusOfModeField } from './spot.ts';

/** What each cause alone would have to be for a loss between two equal single-mode fibres. */
export interface SingleModeCauses {
  readonly kind: 'single-mode';
  readonly offsetUm: number;
  /** In contact. */
  readonly tiltDeg: number;
  /** In air; null where the reflection at the two faces of any gap loses more than was read. */
  readonly airGapUm: number | null;
  readonly leastAirGapLossDb: number;
  readonly narrowerModeFieldUm: number;
  readonly widerModeFieldUm: number;
  readonly suggests: 'offset alone may do it' | 'dirt, a gap or another fibre';
}

/** What each cause alone would have to be for a loss between two equal multimode fibres in contact. */
export interface MultimodeCauses {
  readonly kind: 'multimode';
  /** Null where the formula for the profile does not reach so far. */
  readonly offsetUm: number | null;
  /** Null past the cone that the fibre takes in. */
  readonly tiltDeg: number | null;
  readonly narrowerCoreUm: number;
  readonly leastAirGapLossDb: number;
}

/** On what an explanation rests; listed beside it. */
export const singleModeAssumptions = [
  'both mode fields are Gaussian and equal',
  'each cause is alone',
  'angles are small',
  'glass to glass but for the gap, which is air',
] as const;
export const multimodeAssumptions = [
  'all modes are filled evenly',
  'each cause is alone',
  'glass to glass',
  'the graded profile is parabolic and the offset small',
] as const;

export type ExplainRefusal = NumberRefusal<
  'lossDb' | 'modeFieldUm' | 'wavelengthNm' | 'glassIndex' | 'coreUm' | 'numericalAperture'
>;

/** From here a single-mode loss is more than cores off centre explain: about 1.6 µm at a mode field of 9.2 µm (computed). */
export const suspectLossDb = 0.5;

const lossRange = { lowest: 0, highest: 60 };
const airIndex = 1;
const { modeFieldUm, wavelengthNm, glassIndex, coreUm, numericalAperture } = fibreRanges;

export function explainSingleModeLoss(
  lossDb: number,
  fibre: SingleModeFibre,
): Result<SingleModeCauses, ExplainRefusal> {
  const refusal =
    checkNumber('lossDb', lossDb, lossRange) ?? checkNumbers(fibre, { modeFieldUm, wavelengthNm, glassIndex });
  if (refusal) return failed(refusal);
  const spotRadiusUm = spotRadiusOfModeField(fibre.modeFieldUm);
  const beam = { spotRadiusUm, wavelengthNm: fibre.wavelengthNm };
  const leastAirGapLossDb = gapFacesLossDb(fibre.glassIndex, airIndex);
  const ratio = spotRatioForLoss(lossDb);
  return ok({
    kind: 'single-mode',
    offsetUm: offsetUmForLoss(lossDb, { firstSpotRadiusUm: spotRadiusUm, secondSpotRadiusUm: spotRadiusUm }),
    tiltDeg: degOfRad(tiltRadForLoss(lossDb, { ...beam, indexBetween: fibre.glassIndex })),
    airGapUm: isAtLeast(lossDb, leastAirGapLossDb)
      ? gapUmForLoss(Math.max(0, lossDb - leastAirGapLossDb), { ...beam, indexBetween: airIndex })
      : null,
    leastAirGapLossDb,
    narrowerModeFieldUm: fibre.modeFieldUm / ratio,
    widerModeFieldUm: fibre.modeFieldUm * ratio,
    suggests: isAtLeast(lossDb, suspectLossDb) ? 'dirt, a gap or another fibre' : 'offset alone may do it',
  });
}

export function explainMultimodeLoss(lossDb: number, fibre: MultimodeFibre): Result<MultimodeCauses, ExplainRefusal> {
  const refusal =
    checkNumber('lossDb', lossDb, lossRange) ?? checkNumbers(fibre, { coreUm, numericalAperture, glassIndex });
  if (refusal) return failed(refusal);
  const radiusUm = fibre.coreUm / 2;
  const tiltRad = tiltRadForAngularLoss(lossDb, fibre.glassIndex, fibre.numericalAperture);
  return ok({
    kind: 'multimode',
    offsetUm:
      fibre.profile.kind === 'step'
        ? stepOffsetUmForLoss(lossDb, radiusUm)
        : gradedOffsetUmForLoss(lossDb, radiusUm, fibre.profile.modes),
    tiltDeg: tiltRad === null ? null : degOfRad(tiltRad),
    narrowerCoreUm: narrowerCoreUmForLoss(lossDb, fibre.coreUm),
    leastAirGapLossDb: gapFacesLossDb(fibre.glassIndex, airIndex),
  });
}
