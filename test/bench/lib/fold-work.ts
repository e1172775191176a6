import { foldBench } from '../../../src/core/batch/fold.ts';
import type { Bench } from '../../../src/core/batch/types.ts';
import type { Entry } from '../../../src/core/event/entry.ts';
import { parseLine } from '../../../src/core/event/line.ts';
import { inOrder } from '../../../src/core/event/order.ts';
import { readTakenRecipe } from '../../../src/core/recipe/taken.ts';

export { shopLog } from './shop-log.ts';

/** Parsed and nothing more: these lines were made here, so that they are entries is known. */
export const parseOnly = (texts: readonly string[]): Entry[] => texts.map((text) => JSON.parse(text) as Entry);

export function parseWithCheck(texts: readonly string[]): Entry[] {
  return texts.flatMap((text) => {
    const read = parseLine(text);
    return read.ok ? [read.value] : [];
  });
}

/** Sorts, dedupes, takes out what is voided and applies the rest: the whole fold, given parsed entries. */
export const fold = (entries: readonly Entry[]): Bench => foldBench(inOrder(entries), readTakenRecipe);

/** Whether the fold did what it is measured for: every batch is there and nothing was a misfit. */
export function checkFold(bench: Bench, batches: number): void {
  const found = Object.values(bench.batches);
  const misfits = bench.wide.misfits.length + found.reduce((sum, batch) => sum + batch.misfits.length, 0);
  if (found.length !== batches || misfits > 0) throw new Error(`${found.length} batches, ${misfits} misfits`);
}
