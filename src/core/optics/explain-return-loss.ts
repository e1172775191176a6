import { isAtMost } from '../unit/decimal.ts';
import { checkNumber, checkNumbers, type NumberRefusal } from '../unit/number-check.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import { radOfDeg } from './angle.ts';
import { fibreRanges, type SingleModeFibre } from './fibre.ts';
import { angledReturnLossDb, faceReturnLossDb, gapReturnLossDb, worstGapReturnLossDb } from './fresnel.ts';
import { returnLossFloorDb, returnLossTyping } from './readings.ts';
import { spotRadiusOfModeField } from './spot.ts';

/** The levels at which glass in air reflects, by Fresnel. All positive dB. */
export interface ReturnLossLevels {
  readonly openEndDb: number;
  readonly airGapDb: number;
  /** The two faces of a gap in step. */
  readonly worstAirGapDb: number;
  /** An open end polished at the angle; what theory expects, not what an instrument shows. */
  readonly angledEndDb: number;
}

export type ReturnLossMeaning =
  'stronger than any air gap' | 'air gap, no contact' | 'open end' | 'no level of its own' | 'at the instrument floor';

export interface ReturnLossExplanation {
  readonly levels: ReturnLossLevels;
  readonly meaning: ReturnLossMeaning;
}

/** How near a reading must be to a level to be told as that level, in dB. Common practice, no source. */
const nearDb = 1;
const airIndex = 1;
const angleRange = { lowest: 0, highest: 15 };
const { modeFieldUm, wavelengthNm, glassIndex } = fibreRanges;

export type LevelRefusal = NumberRefusal<'modeFieldUm' | 'wavelengthNm' | 'glassIndex' | 'polishAngleDeg'>;

export function returnLossLevels(
  fibre: SingleModeFibre,
  polishAngleDeg: number,
): Result<ReturnLossLevels, LevelRefusal> {
  const refusal =
    checkNumbers(fibre, { modeFieldUm, wavelengthNm, glassIndex }) ??
    checkNumber('polishAngleDeg', polishAngleDeg, angleRange);
  if (refusal) return failed(refusal);
  return ok({
    openEndDb: faceReturnLossDb(fibre.glassIndex, airIndex),
    airGapDb: gapReturnLossDb(fibre.glassIndex, airIndex),
    worstAirGapDb: worstGapReturnLossDb(fibre.glassIndex, airIndex),
    angledEndDb: angledReturnLossDb(radOfDeg(polishAngleDeg), {
      glassIndex: fibre.glassIndex,
      mediumIndex: airIndex,
      spotRadiusUm: spotRadiusOfModeField(fibre.modeFieldUm),
      wavelengthNm: fibre.wavelengthNm,
    }),
  });
}

/** What a mated pair's return loss (positive dB) points to, for square faces. */
export function explainReturnLoss(
  returnLossDb: number,
  fibre: SingleModeFibre,
  polishAngleDeg: number,
): Result<ReturnLossExplanation, LevelRefusal | NumberRefusal<'returnLossDb'>> {
  const refusal = checkNumber('returnLossDb', returnLossDb, returnLossTyping.possible);
  if (refusal) return failed(refusal);
  const levels = returnLossLevels(fibre, polishAngleDeg);
  return levels.ok ? ok({ levels: levels.value, meaning: meaningOf(returnLossDb, levels.value) }) : levels;
}

function meaningOf(returnLossDb: number, levels: ReturnLossLevels): ReturnLossMeaning {
  const isNear = (levelDb: number): boolean => isAtMost(Math.abs(returnLossDb - levelDb), nearDb);
  if (isNear(levels.airGapDb)) return 'air gap, no contact';
  if (isNear(levels.openEndDb)) return 'open end';
  if (returnLossDb < levels.worstAirGapDb) return 'stronger than any air gap';
  return returnLossDb > returnLossFloorDb ? 'at the instrument floor' : 'no level of its own';
}
