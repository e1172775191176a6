import { elapsedMs, type Moment } from '../unit/moment.ts';
import type { Clock } from './clock.ts';
import { isOver, soonFromMs, spanMs } from './reading.ts';

/** Stages of a clock that call for a person, in order. An at-most clock goes from soon to over; it is never just due. */
export const urgencies = ['soon', 'due', 'over'] as const;
export type Urgency = (typeof urgencies)[number];

export interface Alarm {
  readonly clock: Clock;
  readonly urgency: Urgency;
  /** How long ago this stage began: of a fresh alarm, how late it sounds. */
  readonly lateMs: number;
  /** Not raised at this stage before: the sound starts. */
  readonly fresh: boolean;
}

/** What was raised last time, by clock id. */
export type Raised = Readonly<Record<string, Urgency>>;

/**
 * The alarms that call now. "Seen" quiets one clock for the stage at which it was said and for those before; a later
 * stage raises again, and so does the same stage where new readings have moved it to after the "seen". Keep `raised`
 * and hand it in next time.
 */
export function alarms(
  clocks: readonly Clock[],
  now: Moment,
  previouslyRaised: Raised,
): { alarms: readonly Alarm[]; raised: Raised } {
  const calling = clocks.flatMap((clock) => alarmOf(clock, now, previouslyRaised[clock.id]) ?? []);
  return { alarms: calling, raised: Object.fromEntries(calling.map(({ clock, urgency }) => [clock.id, urgency])) };
}

function alarmOf(clock: Clock, now: Moment, raised: Urgency | undefined): Alarm | null {
  const elapsed = elapsedMs(clock.from, now);
  const urgency = urgencyAt(clock, elapsed);
  if (!urgency || isQuiet(clock, urgency)) return null;
  return { clock, urgency, lateMs: elapsed - beginsMs(clock, urgency), fresh: raised !== urgency };
}

/** The stage that a clock has reached, this many ms after its start; null before the first. */
export function urgencyAt(clock: Clock, elapsed: number): Urgency | null {
  if (isOver(clock, elapsed)) return 'over';
  if (elapsed >= beginsMs(clock, 'due')) return 'due';
  return elapsed >= beginsMs(clock, 'soon') ? 'soon' : null;
}

function isQuiet(clock: Clock, urgency: Urgency): boolean {
  if (!clock.seenAt) return false;
  const seen = urgencyAt(clock, elapsedMs(clock.from, clock.seenAt));
  return seen !== null && urgencies.indexOf(seen) >= urgencies.indexOf(urgency);
}

/** When a stage begins, in ms from the clock's start; Infinity where it never does. */
function beginsMs(clock: Clock, urgency: Urgency): number {
  if (urgency === 'over') return spanMs(clock, clock.over);
  if (urgency === 'soon') return soonFromMs(clock);
  return spanMs(clock, clock.due);
}
