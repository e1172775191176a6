import { elapsedMs, type Moment } from '../unit/moment.ts';
import type { Batch, BenchWide, Mix, Oven } from './types.ts';

/** Raised whenever the fold gives another state from the same entries: older derived rows are then made anew. */
export const foldVersion = 1;

const dayMs = 24 * 3_600_000;

/** Bench-wide state without the recipes, which are kept apart because they are large and seldom change. */
export type Register = Omit<BenchWide, 'recipes'>;

/**
 * What open work still needs of the bench-wide state, so that a start costs as much as what is open and not as much
 * as what was done. Left out: mixes that nothing open took and that are over for a day, and what ovens did more than a
 * day before the oldest open batch. The entries behind them stay in the log.
 */
export function registerOf(wide: BenchWide, open: readonly Batch[], now: Moment): Register {
  const { recipes: _kept, ...rest } = wide;
  const oldest = open.reduce((most, batch) => Math.max(most, elapsedMs(batch.opened, now)), 0);
  return {
    ...rest,
    mixes: keep(wide.mixes, (mix) => mixNeeded(mix, open, now)),
    ovens: Object.fromEntries(
      Object.entries(wide.ovens).map(([id, oven]) => [id, recentOven(oven, oldest + dayMs, now)]),
    ),
  };
}

function keep<Item>(items: Readonly<Record<string, Item>>, needed: (item: Item) => boolean): Record<string, Item> {
  return Object.fromEntries(Object.entries(items).filter(([, item]) => needed(item)));
}

function mixNeeded(mix: Mix, open: readonly Batch[], now: Moment): boolean {
  if (elapsedMs(mix.mixed, now) < mix.workingLifeS * 1000 + dayMs) return true;
  return open.some((batch) => batch.connectors.some((one) => one.mix === mix.id || one.mixSeen === mix.id));
}

/** The setting that was in force when the kept span began stays too. */
function recentOven(oven: Oven, spanMs: number, now: Moment): Oven {
  const recent = oven.history.findIndex(({ at }) => elapsedMs(at, now) <= spanMs);
  const first = recent < 0 ? oven.history.length : recent;
  const setting = oven.history.slice(0, first).findLastIndex(({ kind }) => kind === 'set');
  return setting < 0 && first < oven.history.length
    ? { ...oven, history: oven.history.slice(first) }
    : { ...oven, history: oven.history.slice(Math.max(0, setting)) };
}
