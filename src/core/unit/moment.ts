/**
 * A point in time as one log knows it. `bench` measures, `wall` is what people read; both in ms since 1970.
 * Bench times of different logs have no common zero.
 */
export interface Moment {
  readonly log: string;
  readonly bench: number;
  readonly wall: number;
}

/**
 * Milliseconds from one moment to a later one. Within a log it is the bench difference (may be negative);
 * across logs only the wall difference exists, and it is clamped at 0.
 */
export function elapsedMs(from: Moment, to: Moment): number {
  return from.log === to.log ? to.bench - from.bench : Math.max(0, to.wall - from.wall);
}

/** Whether a span rests on two tablets' wall clocks, so that it must be shown as such. */
export function acrossClocks(from: Moment, to: Moment): boolean {
  return from.log !== to.log;
}

/** The moment `ms` after (or, negative, before) another, in the same log. */
export function shifted(moment: Moment, ms: number): Moment {
  return { log: moment.log, bench: moment.bench + ms, wall: moment.wall + ms };
}

/** Positive when `a` is later than `b`. */
export function compareMoments(a: Moment, b: Moment): number {
  return a.log === b.log ? a.bench - b.bench : a.wall - b.wall;
}
