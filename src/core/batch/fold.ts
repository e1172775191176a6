import { benchWide, enteredAt, type Entry, type Envelope } from '../event/entry.ts';
import { applyToBatch, openBatch } from './apply-batch.ts';
import { applyToWide, emptyBenchWide, openWide, type ReadRecipe } from './apply-wide.ts';
import type { OpenBatch } from './open-batch.ts';
import type { Batch, Bench, BenchWide, Misfit, TakenRecipe } from './types.ts';
import { standing } from './voids.ts';

/** Bench-wide state from bench-wide entries in total order, continued from `from`. */
export function foldWide(
  entries: readonly Entry[],
  readRecipe: ReadRecipe,
  from: BenchWide = emptyBenchWide,
): BenchWide {
  const counting = standing(entries);
  if (counting.length === 0) return from;
  const open = openWide(from);
  for (const entry of counting) applyToWide(open, entry, readRecipe);
  const { copied: _copied, histories: _histories, ...wide } = open;
  return wide;
}

export interface FoldedBatch {
  /** Null where no opening fits: the recipe is not here, or the opening was taken back. */
  readonly batch: Batch | null;
  readonly misfits: readonly Misfit[];
}

/** One batch from its entries in total order. Total: what does not fit changes nothing and is kept as a misfit. */
export function foldBatch(entries: readonly Entry[], recipes: Readonly<Record<string, TakenRecipe>>): FoldedBatch {
  let open: OpenBatch | null = null;
  const before: Misfit[] = [];
  for (const entry of standing(entries)) {
    if (open) {
      applyToBatch(open, entry);
      continue;
    }
    const id = { log: entry.log, seq: entry.seq };
    if (entry.type !== 'batchOpened') {
      before.push({ entry: id, type: entry.type, why: 'batch not opened' });
      continue;
    }
    const taken = recipes[entry.data.recipe];
    if (taken) open = openBatch(entry, taken.recipe);
    else before.push({ entry: id, type: entry.type, why: 'recipe unknown' });
  }
  if (!open) return { batch: null, misfits: before };
  const { stepIndex: _lookup, ...batch } = open;
  const folded: Batch = { ...batch, misfits: [...before, ...batch.misfits] };
  return { batch: folded, misfits: folded.misfits };
}

/** Sorts entries, already in total order, by the batch that they belong to. */
export function byBatch(entries: readonly Entry[]): Map<string, Entry[]> {
  const sorted = new Map<string, Entry[]>();
  for (const entry of entries) {
    const found = sorted.get(entry.batch);
    if (found) found.push(entry);
    else sorted.set(entry.batch, [entry]);
  }
  return sorted;
}

/** The whole bench from entries in total order without duplicates. */
export function foldBench(entries: readonly Entry[], readRecipe: ReadRecipe): Bench {
  const sorted = byBatch(entries);
  let wide = foldWide(sorted.get(benchWide) ?? [], readRecipe);
  wide = noteEntries(wide, entries);
  const batches: Record<string, Batch> = {};
  const strays: Misfit[] = [];
  const behind: Record<string, readonly Entry[]> = {};
  for (const [id, own] of sorted) {
    behind[id] = own;
    if (id === benchWide) continue;
    const { batch, misfits } = foldBatch(own, wide.recipes);
    if (batch) batches[id] = batch;
    else strays.push(...misfits);
  }
  if (strays.length > 0) wide = { ...wide, misfits: [...wide.misfits, ...strays] };
  return { wide, batches, entries: behind };
}

/**
 * What every entry, of a batch or not, tells about its log: when it was written last, and by whom. A start of the
 * page whose wall clock stands behind the last line leaves a gap of unknown length until a person states it.
 */
export function noteEntries(wide: BenchWide, entries: readonly Entry[]): BenchWide {
  const last = new Map<string, Envelope>();
  const lastBy = new Map<string, Map<string, Envelope>>();
  let { unknownGap } = wide;
  for (const entry of entries) {
    const { log, by } = entry;
    if (entry.type === 'tabletStarted') {
      const noted = last.get(log);
      const before = noted ? enteredAt(noted) : wide.lastEntry[log];
      if (before && entry.wall < before.wall) unknownGap = { since: before };
    } else if (entry.type === 'timeStated') unknownGap = null;
    last.set(log, entry);
    if (by === '') continue;
    const people = lastBy.get(log);
    if (people) people.set(by, entry);
    else lastBy.set(log, new Map([[by, entry]]));
  }
  const lastEntry = { ...wide.lastEntry };
  for (const [log, entry] of last) lastEntry[log] = enteredAt(entry);
  const lastEntryBy = { ...wide.lastEntryBy };
  for (const [log, people] of lastBy) {
    for (const [by, entry] of people) lastEntryBy[`${log} ${by}`] = enteredAt(entry);
  }
  return { ...wide, lastEntry, lastEntryBy, unknownGap };
}
