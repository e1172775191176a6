import { acrossClocks, elapsedMs, type Moment } from '../unit/moment.ts';
import type { Clock } from './clock.ts';

/**
 * Running: nothing to do yet. Soon: get ready. Done: an at-least clock is due and waits, or an aim is within its
 * tolerance. Over: past what the recipe allows.
 */
export type ClockState = 'running' | 'soon' | 'done' | 'over';

export interface Reading {
  readonly clock: Clock;
  readonly state: ClockState;
  /** To `due`; negative: since then. Infinity while nothing makes it due. */
  readonly leftMs: number;
  /** To `over`; negative: since then. Infinity where it never is. */
  readonly leftToOverMs: number;
  /** How much of the way from `from` to `due` is behind, 0 to 1; of a cure in time, not in dose. */
  readonly share: number;
  /** Rests on two tablets' clocks or on a gap of unknown length, by the clock itself or by who reads it. */
  readonly uncertain: boolean;
}

/**
 * How long before it is due an at-least clock says soon (time to put gloves on), and before its tolerance begins an
 * aim does; of a short clock half its time. Common practice, no source.
 */
export const soonAtLeastMs = 60_000;
export const soonAimMs = 10_000;
/** An at-most clock says soon for its last tenth, but at least for its last 5 min; of a short one half its time. */
export const soonAtMostMs = 5 * 60_000;
export const soonAtMostShare = 0.1;

/** How a clock stands at a moment. */
export function readClock(clock: Clock, now: Moment): Reading {
  const elapsed = elapsedMs(clock.from, now);
  const span = spanMs(clock, clock.due);
  const leftMs = span - elapsed;
  return {
    clock,
    state: stateAt(clock, elapsed),
    leftMs,
    leftToOverMs: spanMs(clock, clock.over) - elapsed,
    share: span > 0 ? Math.min(1, Math.max(0, elapsed / span)) : 1,
    uncertain: clock.uncertain || acrossClocks(clock.from, now),
  };
}

/** Milliseconds from a clock's start to one of its moments; Infinity where it has none. */
export function spanMs(clock: Clock, moment: Moment | null): number {
  return moment ? elapsedMs(clock.from, moment) : Infinity;
}

/** When a clock begins to say soon, in ms from its start. */
export function soonFromMs(clock: Clock): number {
  const due = spanMs(clock, clock.due);
  switch (clock.kind) {
    case 'at least':
      return before(due, soonAtLeastMs);
    case 'aim':
      return before(spanMs(clock, clock.earliest ?? clock.due), soonAimMs);
    case 'at most':
      return before(due, Math.max(soonAtMostMs, due * soonAtMostShare));
  }
}

const before = (spanMs: number, leadMs: number) => Math.max(spanMs - leadMs, spanMs / 2);

/** Whether a clock is over this many ms after its start. The last moment of a tolerance is still within it. */
export function isOver(clock: Clock, elapsed: number): boolean {
  const over = spanMs(clock, clock.over);
  return clock.kind === 'aim' ? elapsed > over : elapsed >= over;
}

function stateAt(clock: Clock, elapsed: number): ClockState {
  if (isOver(clock, elapsed)) return 'over';
  if (clock.kind !== 'at most' && elapsed >= spanMs(clock, clock.earliest ?? clock.due)) return 'done';
  return elapsed >= soonFromMs(clock) ? 'soon' : 'running';
}
