import type { TagLook } from './tag-look.ts';

/** One clock as the rail takes it; the list comes most urgent first. */
export interface RailClock {
  readonly id: string;
  readonly tag: TagLook;
  readonly remainingMs: number;
  readonly state: 'running' | 'waiting' | 'over';
  /** "working life", "cure, 43 %". */
  readonly text: string;
  /** Its batch. */
  readonly href: string;
}

export interface FoldedClocks<Clock> {
  readonly shown: readonly Clock[];
  readonly folded: readonly Clock[];
}

/**
 * Which clocks are shown in `room` places: what is over always, then the most urgent. Where some are folded, their
 * notice takes one place of those that are not over.
 */
export function foldClocks<Clock extends { readonly state: RailClock['state'] }>(
  clocks: readonly Clock[],
  room: number,
): FoldedClocks<Clock> {
  if (clocks.length <= room) return { shown: clocks, folded: [] };
  const overCount = clocks.filter(({ state }) => state === 'over').length;
  let others = Math.max(overCount === 0 ? 1 : 0, room - 1 - overCount);
  const shown = clocks.filter(({ state }) => state === 'over' || others-- > 0);
  return { shown, folded: clocks.filter((clock) => !shown.includes(clock)) };
}
