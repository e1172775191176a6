import type { Reading } from './reading.ts';

/**
 * What a row asks of people, most pressing first. An aim counts among the clocks that must not be missed; a cure that
 * nothing makes due, and a clock that is done and waits, count among what waits for hands.
 */
export const attentionRanks = ['over', 'must not be missed', 'waits for hands', 'runs by itself', 'nothing'] as const;
export type AttentionRank = (typeof attentionRanks)[number];

/** A key that sorts rows by how soon they need a person. */
export interface Attention {
  readonly rank: AttentionRank;
  /** Within a rank, the smaller first: ms left, negative when past; 0 for hands that may come any time. */
  readonly leftMs: number;
}

/**
 * The key of a row from its clocks and whether some of its work waits for free hands without a clock. A row is as
 * urgent as the most urgent thing in it.
 */
export function attention(readings: readonly Reading[], handsFree: boolean): Attention {
  const keys = readings.map(ofReading);
  if (handsFree) keys.push({ rank: 'waits for hands', leftMs: 0 });
  return keys.sort(compareAttention)[0] ?? { rank: 'nothing', leftMs: Infinity };
}

/** Negative when `a` needs a person before `b`. */
export function compareAttention(a: Attention, b: Attention): number {
  const byRank = attentionRanks.indexOf(a.rank) - attentionRanks.indexOf(b.rank);
  // Two infinities differ by NaN.
  return byRank || (a.leftMs === b.leftMs ? 0 : a.leftMs - b.leftMs);
}

/** Clocks in order of attention; equals by id, so that they never swap places. */
export function byAttention(readings: readonly Reading[]): Reading[] {
  return readings
    .map((reading) => ({ reading, key: ofReading(reading) }))
    .sort((a, b) => compareAttention(a.key, b.key) || (a.reading.clock.id < b.reading.clock.id ? -1 : 1))
    .map(({ reading }) => reading);
}

function ofReading({ clock, state, leftMs, leftToOverMs }: Reading): Attention {
  if (state === 'over') return { rank: 'over', leftMs: leftToOverMs };
  if (clock.kind !== 'at least') return { rank: 'must not be missed', leftMs };
  if (state === 'done') return { rank: 'waits for hands', leftMs };
  return clock.due ? { rank: 'runs by itself', leftMs } : { rank: 'waits for hands', leftMs: 0 };
}
