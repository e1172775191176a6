import { decimal } from '../unit/decimal.ts';
import { checkCount, checkNumber, type NumberRefusal } from '../unit/number-check.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import { cableDbPerKm, componentLosses, type Light } from './component-losses.ts';

/** What is in the light's way from one test lead to the other. */
export interface Parts {
  readonly lengthM: number;
  readonly matedPairs: number;
  readonly tunedSplices: number;
  readonly untunedSplices: number;
  /** The cable's own largest attenuation, where it is above that of the table. */
  readonly actualCableDbPerKm?: number;
  /** Components that are not in the table, with the largest loss of each. */
  readonly others?: readonly { readonly name: string; readonly count: number; readonly eachDb: number }[];
}

export type BudgetRefusal = NumberRefusal<
  'lengthM' | 'matedPairs' | 'tunedSplices' | 'untunedSplices' | 'actualCableDbPerKm' | 'count' | 'eachDb'
>;

const counts = { lowest: 0, highest: 1000 };
const lossEachDb = { lowest: 0, highest: 100 };

function partsRefusal({ lengthM, matedPairs, tunedSplices, untunedSplices, ...rest }: Parts): BudgetRefusal | null {
  const others = rest.others ?? [];
  return (
    checkNumber('lengthM', lengthM, { lowest: 0, highest: 1e6 }) ??
    checkCount('matedPairs', matedPairs, counts) ??
    checkCount('tunedSplices', tunedSplices, counts) ??
    checkCount('untunedSplices', untunedSplices, counts) ??
    checkNumber('actualCableDbPerKm', rest.actualCableDbPerKm ?? 0, lossEachDb) ??
    others.reduce<BudgetRefusal | null>(
      (found, { count, eachDb }) =>
        found ?? checkCount('count', count, counts) ?? checkNumber('eachDb', eachDb, lossEachDb),
      null,
    )
  );
}

/** Maximum acceptable loss in dB: cable by its length, connectors and splices by their number (MIL-STD-2042-6B, 3.3.2). */
export function maximumAcceptableLossDb(light: Light, parts: Parts): Result<number, BudgetRefusal> {
  const refusal = partsRefusal(parts);
  if (refusal) return failed(refusal);
  const perKmDb = Math.max(cableDbPerKm(light), parts.actualCableDbPerKm ?? 0);
  const othersDb = (parts.others ?? []).reduce((sum, { count, eachDb }) => sum + count * eachDb, 0);
  return ok(
    decimal(
      (perKmDb * parts.lengthM) / 1000 +
        parts.matedPairs * componentLosses.matedPairDb +
        parts.tunedSplices * componentLosses.tunedSpliceDb +
        parts.untunedSplices * componentLosses.untunedSpliceDb +
        othersDb,
    ),
  );
}
