import type { Batch, Bench } from '../core/batch/types.ts';
import type { Draft } from '../core/event/entry.ts';
import { summaryKey, summaryRow } from '../core/review/summary-row.ts';
import type { Derived } from '../log/store.ts';
import { rowKeys } from './row-keys.ts';

/** The rows, besides the register, that follow from what an append changed. */
export function derivedRows(before: Bench, after: Bench, drafts: readonly Draft[]): Derived[] {
  const touched = new Set(drafts.map(({ batch }) => batch));
  const batches = [...touched].flatMap((id) => summaryRows(before.batches[id], after.batches[id]));
  const recipes = drafts.flatMap((draft): Derived[] =>
    draft.type === 'recipeTaken' ? [{ key: rowKeys.recipe(draft.data.hash), value: draft.data.text }] : [],
  );
  return [...recipes, ...batches];
}

/** A closed batch has one summary row; a reopened one loses it again. */
function summaryRows(before: Batch | undefined, after: Batch | undefined): Derived[] {
  const stale = keyOf(before);
  const row = after ? summaryRow(after) : null;
  const key = row ? summaryKey(row) : null;
  return [
    ...(stale !== null && stale !== key ? [{ key: stale, remove: true } as const] : []),
    ...(row && key !== null ? [{ key, value: JSON.stringify(row) }] : []),
  ];
}

function keyOf(batch: Batch | undefined): string | null {
  const row = batch ? summaryRow(batch) : null;
  return row ? summaryKey(row) : null;
}
