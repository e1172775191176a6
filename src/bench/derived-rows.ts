import { registerOf, foldVersion } from '../core/batch/register.ts';
import type { Batch, Bench } from '../core/batch/types.ts';
import type { Draft, Head } from '../core/event/entry.ts';
import { summaryKey, summaryRow } from '../core/review/summary-row.ts';
import type { Moment } from '../core/unit/moment.ts';
import type { Derived } from '../log/store.ts';

/** Keys of the rows that are written with each append, so that a start need not read history. */
export const rowKeys = {
  /** Which of the logs here this tablet writes. */
  own: 'own',
  wide: 'wide',
  recipe: (hash: string) => `recipe:${hash}`,
  open: (batch: string) => `open:${batch}`,
  /** Where the summary row of a closed batch stands. */
  closed: (batch: string) => `closed:${batch}`,
} as const;

export interface RegisterRow {
  readonly fold: number;
  /** How far each log had come: a register that stands elsewhere is made anew. */
  readonly heads: Readonly<Record<string, number>>;
  readonly wide: ReturnType<typeof registerOf>;
}

/** The rows that follow from what an append changed. */
export function derivedRows(
  before: Bench,
  after: Bench,
  drafts: readonly Draft[],
  heads: readonly Head[],
  now: Moment,
): Derived[] {
  const touched = new Set(drafts.map(({ batch }) => batch));
  const batches = [...touched].flatMap((id) => batchRows(before.batches[id], after.batches[id], id));
  const recipes = drafts.flatMap((draft): Derived[] =>
    draft.type === 'recipeTaken' ? [{ key: rowKeys.recipe(draft.data.hash), value: draft.data.text }] : [],
  );
  return [registerRow(after, heads, now), ...recipes, ...batches];
}

export function registerRow(bench: Bench, heads: readonly Head[], now: Moment): Derived {
  const open = Object.values(bench.batches).filter((batch) => !batch.closed);
  const row: RegisterRow = {
    fold: foldVersion,
    heads: Object.fromEntries(heads.map(({ log, seq }) => [log, seq])),
    wide: registerOf(bench.wide, open, now),
  };
  return { key: rowKeys.wide, value: JSON.stringify(row) };
}

/** An open batch is listed; a closed one has its summary row instead, and a reopened one loses it again. */
export function batchRows(before: Batch | undefined, after: Batch | undefined, id: string): Derived[] {
  const rows: Derived[] = [];
  const staleRow = before ? summaryRow(before) : null;
  const stale = staleRow ? summaryKey(staleRow) : null;
  const row = after ? summaryRow(after) : null;
  if (row) {
    const key = summaryKey(row);
    if (stale !== null && stale !== key) rows.push({ key: stale, remove: true });
    rows.push({ key, value: JSON.stringify(row) }, { key: rowKeys.closed(id), value: key });
    rows.push({ key: rowKeys.open(id), remove: true });
    return rows;
  }
  if (stale !== null) rows.push({ key: stale, remove: true }, { key: rowKeys.closed(id), remove: true });
  if (after && (!before || before.closed)) rows.push({ key: rowKeys.open(id), value: '' });
  if (!after && before) rows.push({ key: rowKeys.open(id), remove: true });
  return rows;
}
