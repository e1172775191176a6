import type { Entry } from '../event/entry.ts';
import { elapsedMs, type Moment } from '../unit/moment.ts';
import type { Batch, BenchWide, Mix, Oven } from './types.ts';

/** Raised whenever the fold gives another state from the same entries: older derived rows are then made anew. */
export const foldVersion = 1;

const dayMs = 24 * 3_600_000;

/** Bench-wide state without the recipes, which are kept apart because they are large and seldom change. */
export type Register = Omit<BenchWide, 'recipes'>;

/** A batch with all the entries behind it: also what was taken back counts, since a void can bring older state back. */
export interface OpenWork {
  readonly batch: Batch;
  readonly entries: readonly Entry[];
}

/**
 * What open work still needs of the bench-wide state, so that a start costs as much as what is open and not as much
 * as what was done. Left out: mixes that nothing open ever took and that are over for a day, and what ovens did more
 * than a day before the oldest open batch. The entries behind them stay in the log.
 */
export function registerOf(wide: BenchWide, open: readonly OpenWork[], now: Moment): Register {
  const { recipes: _kept, ...rest } = wide;
  const oldestMs = open.reduce((most, { batch }) => Math.max(most, elapsedMs(batch.opened, now)), 0);
  const taken = new Set(open.flatMap(({ entries }) => entries.flatMap(mixIn)));
  return {
    ...rest,
    mixes: Object.fromEntries(Object.entries(wide.mixes).filter(([id, mix]) => taken.has(id) || lastsYet(mix, now))),
    ovens: Object.fromEntries(
      Object.entries(wide.ovens).map(([id, oven]) => [id, recentOven(oven, oldestMs + dayMs, now)]),
    ),
  };
}

const mixIn = ({ data }: Entry): string[] => ('mix' in data && data.mix !== undefined ? [data.mix] : []);

const lastsYet = (mix: Mix, now: Moment): boolean => elapsedMs(mix.mixed, now) < mix.workingLifeS * 1000 + dayMs;

/** The setting that was in force when the kept span began stays too. */
function recentOven(oven: Oven, spanMs: number, now: Moment): Oven {
  const recent = oven.history.findIndex(({ at }) => elapsedMs(at, now) <= spanMs);
  const first = recent < 0 ? oven.history.length : recent;
  const setting = oven.history.slice(0, first).findLastIndex(({ kind }) => kind === 'set');
  return setting < 0 && first < oven.history.length
    ? { ...oven, history: oven.history.slice(first) }
    : { ...oven, history: oven.history.slice(Math.max(0, setting)) };
}
