import type { ReadRecipe } from '../core/batch/apply-wide.ts';
import { foldBench } from '../core/batch/fold.ts';
import type { Bench } from '../core/batch/types.ts';
import type { Entry, Line } from '../core/event/entry.ts';
import { latestTime } from '../core/event/clock.ts';
import { summaryKey, summaryKeysFrom, summaryRow } from '../core/review/summary-row.ts';
import type { Derived, LogStore } from '../log/store.ts';
import type { Found } from './load-bench.ts';
import { readRows, type ReadLines } from './read-lines.ts';
import { rowKeys } from './row-keys.ts';

const linesAtOnce = 10_000;
/** A write of this many rows ends well within a store's patience. */
const rowsAtOnce = 500;

/**
 * The bench from the whole log, with every derived row but the register, which the next append writes: after an upgrade
 * of the fold, or where rows were lost.
 */
export async function rebuildBench(store: LogStore, readRecipe: ReadRecipe): Promise<Found> {
  const { entries, unreadable } = await readAllLines(store);
  const bench = foldBench(entries, readRecipe);
  const rows = [...recipeRows(bench, entries), ...(await summaryChanges(store, bench))];
  for (let at = 0; at < rows.length; at += rowsAtOnce) await store.putDerived(rows.slice(at, at + rowsAtOnce));
  const latest = latestTime(entries.map(({ time }) => time));
  return { bench: onlyOpen(bench), unreadable, whole: entries.length === 0, latest };
}

async function readAllLines(store: LogStore): Promise<ReadLines> {
  const all: Line[] = [];
  for (;;) {
    const lines = await store.lines(all.at(-1), linesAtOnce);
    all.push(...lines);
    if (lines.length < linesAtOnce) return readRows(all);
  }
}

function recipeRows(bench: Bench, entries: readonly Entry[]): Derived[] {
  const rows = new Map<string, Derived>();
  for (const { type, data } of entries) {
    if (type !== 'recipeTaken' || !bench.wide.recipes[data.hash]) continue;
    const key = rowKeys.recipe(data.hash);
    rows.set(key, { key, value: data.text });
  }
  return [...rows.values()];
}

/** Writes what differs, and removes rows that stand for no closed batch. */
async function summaryChanges(store: LogStore, bench: Bench): Promise<Derived[]> {
  const { lower, upper } = summaryKeysFrom(0);
  const there = new Map((await store.derivedBetween(lower, upper)).map(({ key, value }) => [key, value]));
  const rows = Object.values(bench.batches).flatMap((batch): Derived[] => {
    const row = summaryRow(batch);
    if (!row) return [];
    const key = summaryKey(row);
    const value = JSON.stringify(row);
    const known = there.get(key) === value;
    there.delete(key);
    return known ? [] : [{ key, value }];
  });
  return [...rows, ...[...there.keys()].map((key) => ({ key, remove: true }) as const)];
}

function onlyOpen(bench: Bench): Bench {
  const open = Object.values(bench.batches).filter((batch) => !batch.closed);
  return {
    wide: bench.wide,
    batches: Object.fromEntries(open.map((batch) => [batch.id, batch])),
    entries: Object.fromEntries(open.map(({ id }) => [id, bench.entries[id] ?? []])),
  };
}
