import type { ClockReading } from './clock.ts';

/** Longest silence between two looks that is not yet a sleep, ms. */
export const longestGapMs = 5_000;
/** Largest disagreement of the two clocks that is not yet a clock set, ms. */
export const largestDriftMs = 2_000;

/** What the page went through since the previous look. */
export type Rest = 'awake' | 'hidden' | 'frozen';

export interface ClockJump {
  readonly kind: 'tabletWoke' | 'clockSet';
  /** What each clock says has passed since the previous look, ms. */
  readonly wallMs: number;
  readonly monoMs: number;
  /** False when the wall clock ran ahead alone: a sleep with a stopped monotonic clock looks just like a clock set forward. */
  readonly certain: boolean;
}

/**
 * What happened to the tablet's time between two readings of the same page.
 *
 * On Android and iPadOS the monotonic clock stops in sleep (on Windows it goes on), so a wall clock that ran ahead
 * while the page was hidden is taken as sleep; the same with the page in view all the time is a clock that was set.
 */
export function compareClocks(previous: ClockReading, current: ClockReading, rest: Rest = 'awake'): ClockJump | null {
  const wallMs = current.wall - previous.wall;
  const monoMs = current.mono - previous.mono;
  const ahead = wallMs - monoMs > largestDriftMs;
  const jump = (kind: ClockJump['kind']): ClockJump => ({ kind, wallMs, monoMs, certain: !ahead });
  if (rest === 'frozen' || monoMs > longestGapMs) return jump('tabletWoke');
  if (rest === 'hidden' && ahead && wallMs > longestGapMs) return jump('tabletWoke');
  return Math.abs(wallMs - monoMs) > largestDriftMs ? jump('clockSet') : null;
}
