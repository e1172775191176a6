import { foldBatch } from '../core/batch/fold.ts';
import type { TakenRecipe } from '../core/batch/types.ts';
import { readSummaryRow } from '../core/review/read-summary-row.ts';
import { summaryKey, summaryKeysFrom, summaryRow, type SummaryRow } from '../core/review/summary-row.ts';
import type { Derived, LogStore } from '../log/store.ts';
import { readLines } from './read-lines.ts';

/**
 * The summary rows that can tell of something at `fromWallMs` or later, one a batch. A row of another version, or a
 * damaged one, is made anew from the lines of its batch and written in the place of the old one.
 */
export async function readSummaryRows(
  store: LogStore,
  recipes: Readonly<Record<string, TakenRecipe>>,
  fromWallMs: number,
): Promise<readonly SummaryRow[]> {
  const { lower, upper } = summaryKeysFrom(fromWallMs);
  const rows = new Map<string, SummaryRow>();
  const changes: Derived[] = [];
  for (const { key, value } of await store.derivedBetween(lower, upper)) {
    const read = readSummaryRow(value);
    const row = read.ok ? read.value : await rowAnew(store, recipes, batchOf(key));
    if (row) rows.set(row.batch, row);
    if (read.ok) continue;
    const anew = row ? summaryKey(row) : null;
    if (anew !== key) changes.push({ key, remove: true });
    if (row && anew !== null) changes.push({ key: anew, value: JSON.stringify(row) });
  }
  // What cannot be written now is made anew next time.
  if (changes.length > 0) await store.putDerived(changes).catch(() => undefined);
  return [...rows.values()];
}

/** The batch that a key ends with; it may hold colons itself. */
const batchOf = (key: string): string => key.split(':').slice(2).join(':');

async function rowAnew(
  store: LogStore,
  recipes: Readonly<Record<string, TakenRecipe>>,
  id: string,
): Promise<SummaryRow | null> {
  const { batch } = foldBatch(readLines(await store.linesOfBatch(id), id).entries, recipes);
  return batch && summaryRow(batch);
}
