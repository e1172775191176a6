import type { Bench } from '../core/batch/types.ts';
import { benchWide, type Draft } from '../core/event/entry.ts';
import type { Derived } from '../log/store.ts';

/*
 * What a command needs and showing the bench does not is loaded once the bench stands, so that a tablet shows its
 * clocks sooner. Where it cannot be loaded, these reject, and the command is not saved.
 */

type Deciding = typeof import('./deciding.ts');

export const deciding = (): Promise<Deciding> => import('./deciding.ts');

export const decide = async (...asked: Parameters<Deciding['decide']>) => (await deciding()).decide(...asked);

export const readSummaryRows = async (...asked: Parameters<Deciding['readSummaryRows']>) =>
  (await deciding()).readSummaryRows(...asked);

/** Bench-wide entries leave no row of their own, but for a recipe: a start writes its first entry without any of this. */
export async function derivedRows(before: Bench, after: Bench, drafts: readonly Draft[]): Promise<Derived[]> {
  const leavesRow = ({ batch, type }: Draft) => batch !== benchWide || type === 'recipeTaken';
  return drafts.some(leavesRow) ? (await deciding()).derivedRows(before, after, drafts) : [];
}
