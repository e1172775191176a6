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

/** How many batches these lines fold to. Throws where one is missing or an entry did not fit: then nothing is measured. */
export function checkedFold(texts: readonly string[]): number {
  const entries = parseWithCheck(texts);
  const { batches, wide } = fold(entries);
  const found = Object.values(batches);
  const misfits = wide.misfits.length + found.reduce((sum, batch) => sum + batch.misfits.length, 0);
  const opened = entries.filter(({ type }) => type === 'batchOpened').length;
  if (entries.length !== texts.length || found.length !== opened || misfits > 0) {
    throw new Error(
      `${entries.length} of ${texts.length} lines, ${found.length} of ${opened} batches, ${misfits} misfits`,
    );
  }
  return found.length;
}
