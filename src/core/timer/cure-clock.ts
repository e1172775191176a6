import type { Batch, Bench, BenchWide, Load } from '../batch/types.ts';
import { cureOf, type Cure, type CureWhy } from '../cure/cure.ts';
import { elapsedMs, type Moment } from '../unit/moment.ts';
import type { Clock } from './clock.ts';

/** The cure of a load, with the oven whose id is the load's station; null when the load is at no cure step. */
export function cureOfLoad(wide: BenchWide, batch: Batch, load: Load): Cure | null {
  const step = batch.recipe.steps[load.step];
  if (step?.kind !== 'cure') return null;
  return cureOf({
    from: load.from,
    setPointC: step.setPointC,
    adhesive: batch.recipe.adhesive,
    oven: wide.ovens[load.station]?.history ?? [],
  });
}

/** How a cure stands at one moment; a dose of 1 is a full cure. */
export interface CureNow {
  readonly dose: number;
  readonly temperatureC: number;
  /** Coldest since the dose first counted; null before that. */
  readonly coldestC: number | null;
  readonly hottestC: number;
  readonly why: CureWhy;
}

/** How the cure behind a clock stands now; null for any other clock. */
export function doseNow(bench: Bench, clock: Clock, now: Moment): CureNow | null {
  if (clock.about.type !== 'cure') return null;
  const { load: id } = clock.about;
  const batch = bench.batches[clock.batch];
  const load = batch?.loads.find((one) => one.id === id);
  const cure = batch && load ? cureOfLoad(bench.wide, batch, load) : null;
  return cure && load ? cureNow(cure, elapsedMs(load.from, now)) : null;
}

/** How a cure stands at a time in ms since its load went in. */
export function cureNow(cure: Cure, ms: number): CureNow {
  return {
    dose: cure.doseAt(ms),
    temperatureC: cure.temperatureAtC(ms),
    coldestC: cure.coldestSinceCountingC(ms),
    hottestC: cure.hottestC(ms),
    why: cure.whyAt(ms),
  };
}
