import type { Batch, Bench, BenchWide, Load } from '../batch/types.ts';
import { compareMoments, shifted, type Moment } from '../unit/moment.ts';
import { clockId, type Clock, type ClockAbout, type ClockKind } from './clock.ts';
import { cureOfLoad } from './cure-clock.ts';
import { workingLives, type RunningLife } from './working-lives.ts';

/**
 * Every clock that runs on the bench: one for each running load at a cure, a wait or a timed polish, and one for each
 * mix that a batch still has to use up. Ordered by id, so that the same state gives the same list.
 */
export function clocks(bench: Bench): Clock[] {
  return Object.values(bench.batches)
    .filter((batch) => batch.closed === null)
    .flatMap((batch) => clocksOf(bench.wide, batch))
    .sort((a, b) => (a.id < b.id ? -1 : 1));
}

/** The clocks of one batch. */
export function clocksOf(wide: BenchWide, batch: Batch): Clock[] {
  const running = batch.loads.filter((load) => load.ended === null);
  return [
    ...running.flatMap((load) => loadClock(wide, batch, load) ?? []),
    ...workingLives(wide, batch).map((life) => lifeClock(wide, batch, life)),
  ];
}

function loadClock(wide: BenchWide, batch: Batch, load: Load): Clock | null {
  const step = batch.recipe.steps[load.step];
  const { from } = load;
  const after = (ms: number) => shifted(from, ms);
  const base = { step: load.step, from };
  switch (step?.kind) {
    case 'cure': {
      const cure = cureOfLoad(wide, batch, load);
      if (!cure) return null;
      return clock(wide, batch, {
        ...base,
        id: clockId('cure', load.id, batch.id),
        kind: 'at least',
        about: { type: 'cure', load: load.id, station: load.station, why: cure.why },
        due: cure.dueMs === null ? null : after(cure.dueMs),
        over: cure.overMs === null ? null : after(cure.overMs),
        uncertain: cure.acrossClocks,
      });
    }
    case 'wait':
      return clock(wide, batch, {
        ...base,
        id: clockId('wait', load.id, batch.id),
        kind: 'at least',
        about: { type: 'wait', load: load.id },
        due: after(step.atLeastS * 1000),
        over: null,
      });
    case 'polish': {
      if (step.until.kind !== 'time') return null;
      const { aimS, toleranceS } = step.until;
      return clock(wide, batch, {
        ...base,
        id: clockId('polish', load.id, batch.id),
        kind: 'aim',
        about: { type: 'polish', load: load.id, filmUm: step.filmUm },
        due: after(aimS * 1000),
        over: after((aimS + toleranceS) * 1000),
        earliest: after(Math.max(0, aimS - toleranceS) * 1000),
      });
    }
    default:
      return null;
  }
}

function lifeClock(wide: BenchWide, batch: Batch, { mix, connectors, step, limitStep }: RunningLife): Clock {
  const due = shifted(mix.mixed, mix.workingLifeS * 1000);
  return clock(wide, batch, {
    id: clockId('life', mix.id, batch.id),
    kind: 'at most',
    about: { type: 'working life', mix: mix.id, lot: mix.lot, connectors, limitStep },
    step,
    from: mix.mixed,
    due,
    over: due,
  });
}

interface Told {
  readonly id: string;
  readonly kind: ClockKind;
  readonly about: ClockAbout;
  readonly step: number;
  readonly from: Moment;
  readonly due: Moment | null;
  readonly over: Moment | null;
  readonly earliest?: Moment;
  readonly uncertain?: boolean;
}

function clock(wide: BenchWide, batch: Batch, told: Told): Clock {
  const gap = wide.unknownGap?.since;
  const acrossGap = gap?.log === told.from.log && gap.bench >= told.from.bench;
  const seenAt = (batch.seen[told.id] ?? wide.seen[told.id])?.at ?? null;
  // While nobody has said how long the tablet was off, an at-most clock counts as run out in that gap. Of an at-least
  // clock bench time counts nothing of it, so there is nothing to take away.
  const ended =
    acrossGap && told.kind === 'at most' ? { due: earlier(told.due, gap), over: earlier(told.over, gap) } : {};
  return {
    ...told,
    earliest: told.earliest ?? null,
    ...ended,
    uncertain: acrossGap || (told.uncertain ?? false),
    batch: batch.id,
    tag: batch.tag,
    seen: seenAt !== null,
    seenAt,
  };
}

function earlier(one: Moment | null, other: Moment): Moment {
  return one && compareMoments(one, other) < 0 ? one : other;
}
