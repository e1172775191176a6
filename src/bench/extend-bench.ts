import type { ReadRecipe } from '../core/batch/apply-wide.ts';
import { foldBatch, foldWide, noteEntries } from '../core/batch/fold.ts';
import type { Batch, Bench, BenchWide, Misfit } from '../core/batch/types.ts';
import { idKey } from '../core/batch/voids.ts';
import { benchWide, type Entry } from '../core/event/entry.ts';

/**
 * The bench with entries added that are later than all it knows: the same as all of them folded at once. Each batch
 * that they touch is folded anew. Where they take a bench-wide entry back, all bench-wide entries must be at hand.
 */
export function extendBench(bench: Bench, added: readonly Entry[], readRecipe: ReadRecipe): Bench {
  const entries: Record<string, readonly Entry[]> = { ...bench.entries };
  for (const entry of added) entries[entry.batch] = [...(entries[entry.batch] ?? []), entry];
  const ofBench = added.filter(({ batch }) => batch === benchWide);
  const folded = ofBench.some(({ type }) => type === 'voided')
    ? wholeWide(bench.wide, entries[benchWide] ?? [], readRecipe)
    : foldWide(ofBench, readRecipe, bench.wide);
  let wide = noteEntries(folded, added);
  const batches: Record<string, Batch> = { ...bench.batches };
  // A recipe that comes, or is taken back, decides whether a batch can be folded at all.
  const touched = wide.recipes === bench.wide.recipes ? added.map(({ batch }) => batch) : Object.keys(entries);
  for (const id of new Set(touched)) {
    if (id === benchWide) continue;
    const own = entries[id] ?? [];
    const { batch, misfits } = foldBatch(own, wide.recipes);
    if (batch) batches[id] = batch;
    else delete batches[id];
    const strays = batch ? [] : misfits;
    const mayHaveStrayed = bench.entries[id] !== undefined && bench.batches[id] === undefined;
    if (strays.length > 0 || mayHaveStrayed) {
      wide = { ...wide, misfits: [...without(wide.misfits, own), ...strays] };
    }
  }
  return { wide, batches, entries };
}

/**
 * Bench-wide state from all bench-wide entries. What entries of batches tell of their logs, and misfits of batches that
 * were never opened, stay as they were known.
 */
export function wholeWide(known: BenchWide, entries: readonly Entry[], readRecipe: ReadRecipe): BenchWide {
  const { lastEntry, lastEntryBy, unknownGap } = known;
  const folded = foldWide(entries, readRecipe);
  const strays = without(known.misfits, entries);
  return { ...folded, misfits: [...folded.misfits, ...strays], lastEntry, lastEntryBy, unknownGap };
}

function without(misfits: readonly Misfit[], entries: readonly Entry[]): readonly Misfit[] {
  if (misfits.length === 0) return misfits;
  const own = new Set(entries.map(idKey));
  return misfits.filter(({ entry }) => !own.has(idKey(entry)));
}
