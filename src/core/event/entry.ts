import type { Moment } from '../unit/moment.ts';
import type { Fact } from './facts.ts';

/** Everything about an entry except what it says. Times in ms; `offset` in minutes east of UTC. */
export interface Envelope {
  /** Random id, new whenever local storage is new. */
  readonly log: string;
  /** Counts per log from 1 without gaps. */
  readonly seq: number;
  /** Hybrid logical clock as text that sorts; orders and does nothing else. */
  readonly time: string;
  /** Corrected time that measures. */
  readonly bench: number;
  /** What the tablet's clock showed. */
  readonly wall: number;
  /** Monotonic ms of the page, and which page. */
  readonly mono: number;
  readonly page: string;
  readonly offset: number;
  readonly zone: string;
  /** Operator's initials; empty before anyone signed on. */
  readonly by: string;
  /** Batch id, or "bench" for bench-wide entries. */
  readonly batch: string;
  /** SHA-256 of the log's previous line, in hex; of nothing for the first. */
  readonly prev: string;
}

/** One parsed line of a log. */
export type Entry = Envelope & Fact;

/** What a decision produces: a fact and where it belongs. The envelope is added at the edge. */
export type Draft = { readonly batch: string } & Fact;

export const benchWide = 'bench';

export interface EntryId {
  readonly log: string;
  readonly seq: number;
}

/** One line as it is stored, hashed, exported and exchanged. */
export interface Line extends EntryId {
  readonly batch: string;
  readonly text: string;
}

/** Where a log stands: enough to write its next line. */
export interface Head extends EntryId {
  readonly hash: string;
  readonly time: string;
  readonly bench: number;
  readonly wall: number;
  readonly mono: number;
  readonly page: string;
}

/** When it was entered. */
export function enteredAt(entry: Envelope): Moment {
  return { log: entry.log, bench: entry.bench, wall: entry.wall };
}
