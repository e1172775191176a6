import type { Bench } from '../core/batch/types.ts';
import { benchWide, type Draft } from '../core/event/entry.ts';
import type { Derived } from '../log/store.ts';

/* Where what comes later cannot be loaded these reject, and a command that needs it is not saved. */

export type Later = typeof import('./later.ts');

let loading: Promise<Later> | null = null;

/** Kept once it is there: a browser takes several turns to find a module again that it has already. */
export function later(): Promise<Later> {
  loading ??= import('./later.ts').catch((error: unknown) => {
    loading = null;
    throw error;
  });
  return loading;
}

export const decide = async (...asked: Parameters<Later['decide']>) => (await later()).decide(...asked);

export const readSummaryRows = async (...asked: Parameters<Later['readSummaryRows']>) =>
  (await later()).readSummaryRows(...asked);

/** Bench-wide entries leave no row of their own, but for a recipe: a start writes its first entry without any of this. */
export async function derivedRows(before: Bench, after: Bench, drafts: readonly Draft[]): Promise<Derived[]> {
  const leavesRow = ({ batch, type }: Draft) => batch !== benchWide || type === 'recipeTaken';
  return drafts.some(leavesRow) ? (await later()).derivedRows(before, after, drafts) : [];
}
