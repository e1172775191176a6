import type { Moment } from '../unit/moment.ts';

/** What a person told of an oven. Temperatures in °C; `warmUpS` is the time constant of its lag in seconds. */
export type OvenEntry = { readonly at: Moment } & (
  | { readonly kind: 'set'; readonly setPointC: number; readonly warmUpS: number | null }
  | { readonly kind: 'read'; readonly temperatureC: number }
  | { readonly kind: 'door opened' }
  | { readonly kind: 'power cut' }
);

/** An entry placed on a time line: ms after (negative: before) that line's zero. */
export interface PlacedEntry {
  readonly ms: number;
  readonly entry: OvenEntry;
}

/** No lag that a shop has measured reaches back further than this. */
export const forgottenAfterMs = 24 * 3_600_000;

/**
 * Milliseconds from a moment to another, negative when it lies before. Entries of another log have no common bench
 * time: they are placed by the difference of wall clocks.
 */
export function placedMs(zero: Moment, at: Moment): number {
  return zero.log === at.log ? at.bench - zero.bench : at.wall - zero.wall;
}

/**
 * The entries that bear on what the oven does from `zero` on, oldest first: back to the last setting that is older
 * than a day, since everything before it is forgotten by then. Keeps the cost of a clock apart from an oven's age.
 */
export function bearingEntries(history: readonly OvenEntry[], zero: Moment): readonly PlacedEntry[] {
  const placed: PlacedEntry[] = [];
  for (let index = history.length - 1; index >= 0; index -= 1) {
    const entry = history[index];
    if (!entry) continue;
    const ms = placedMs(zero, entry.at);
    placed.push({ ms, entry });
    if (entry.kind === 'set' && ms < -forgottenAfterMs) break;
  }
  return placed.reverse().sort((a, b) => a.ms - b.ms);
}
