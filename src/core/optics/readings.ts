import { decimal } from '../unit/decimal.ts';
import { checkNumbers, checkTyped, type NumberRefusal, type TypingRange } from '../unit/number-check.ts';
import { failed, ok, type Result } from '../unit/result.ts';

/** What a loss meter of this trade can show, and what needs no question. Common practice, no source. */
export const lossTyping: TypingRange = {
  possible: { lowest: 0, highest: 100 },
  usual: { lowest: 0, highest: 10 },
};
export const returnLossTyping: TypingRange = {
  possible: { lowest: 0, highest: 120 },
  usual: { lowest: 8, highest: 85 },
};
const powerRangeDbm = { lowest: -110, highest: 40 };

/** Above this a bench instrument reads its own floor. Common practice, no source. */
export const returnLossFloorDb = 75;

/** A number that may be kept; an unusual one only after the person was asked. */
export type Typed = 'usual' | 'unusual';

export interface PowerReadings {
  /** With the reference lead alone. */
  readonly referencePowerDbm: number;
  /** With the cable in place. */
  readonly testPowerDbm: number;
}

/** More power with the cable than without: the reference lead was dirty or defective. Clean or replace it and reference again. */
export interface ReferenceAgain {
  readonly code: 'reference again';
  readonly lossDb: number;
}

export type LossRefusal = ReferenceAgain | NumberRefusal<'lossDb' | 'referencePowerDbm' | 'testPowerDbm'>;

export interface TakenLoss {
  readonly lossDb: number;
  readonly typed: Typed;
}

/** A loss as the meter shows it. A negative one is refused (MIL-STD-2042-6B, methods 6C1 and 6E1). */
export function takeLoss(lossDb: number): Result<TakenLoss, LossRefusal> {
  const loss = decimal(lossDb);
  const isBelieved = -loss <= lossTyping.possible.highest;
  if (loss < 0 && isBelieved) return failed({ code: 'reference again', lossDb: loss });
  const typed = checkTyped('lossDb', loss, lossTyping);
  return typeof typed === 'string' ? ok({ lossDb: loss, typed }) : failed(typed);
}

/** Loss from two readings: reference power less test power (MIL-STD-2042-6B). */
export function lossFromReadings(readings: PowerReadings): Result<TakenLoss, LossRefusal> {
  const refusal = checkNumbers(readings, { referencePowerDbm: powerRangeDbm, testPowerDbm: powerRangeDbm });
  return refusal ? failed(refusal) : takeLoss(readings.referencePowerDbm - readings.testPowerDbm);
}

export interface TakenReturnLoss {
  /** Always positive, as IEC 61300-3-6 counts it. */
  readonly returnLossDb: number;
  /** It was given as a reflectance, which is the same quantity below zero. */
  readonly asReflectance: boolean;
  readonly atInstrumentFloor: boolean;
  readonly typed: Typed;
}

/** Return loss with either sign. */
export function takeReturnLoss(givenDb: number): Result<TakenReturnLoss, NumberRefusal<'returnLossDb'>> {
  const returnLossDb = decimal(Math.abs(givenDb));
  const typed = checkTyped('returnLossDb', returnLossDb, returnLossTyping);
  if (typeof typed !== 'string') return failed(typed);
  return ok({ returnLossDb, asReflectance: givenDb < 0, atInstrumentFloor: returnLossDb > returnLossFloorDb, typed });
}
