import type { CycleParts } from './cycle.ts';
import { quantileInPlace } from './quantile.ts';
import { ratioOf, type Ratio } from './ratio.ts';

/** One part of the cycle times of several connectors. Medians of parts need not add up; sums do. */
export interface Spread {
  /** R type 7, as the 90th percentile. */
  readonly medianMs: number;
  readonly ninetiethPercentileMs: number;
  readonly sumMs: number;
}

export interface CycleSpread {
  readonly connectors: number;
  readonly total: Spread;
  readonly handsOn: Spread;
  readonly cure: Spread;
  readonly waiting: Spread;
  /** How many of them rest on two tablets' wall clocks. */
  readonly acrossClocks: number;
}

/** Numbers of a window. `carriedIn + started` is `passed + scrapped + inWork`. */
export interface Totals {
  /** In work as the window began. */
  readonly carriedIn: number;
  /** Of batches opened in the window. */
  readonly started: number;
  readonly passed: number;
  readonly scrapped: number;
  /** Passed or scrapped in the window. */
  readonly finished: number;
  /** In work as the window ended; for a window that still runs, now. */
  readonly inWork: number;
  /** Right first time, of those finished. */
  readonly firstPass: Ratio | null;
  /** Cycle times of the connectors that passed, and apart from them of those scrapped; null where there are none. */
  readonly cycle: { readonly passed: CycleSpread | null; readonly scrapped: CycleSpread | null };
}

interface Times {
  totalMs: number[];
  handsOnMs: number[];
  cureMs: number[];
  waitingMs: number[];
  acrossClocks: number;
}

/** Totals while they are being counted. */
export interface Tally {
  carriedIn: number;
  started: number;
  inWork: number;
  firstPass: number;
  passed: Times;
  scrapped: Times;
}

const noTimes = (): Times => ({ totalMs: [], handsOnMs: [], cureMs: [], waitingMs: [], acrossClocks: 0 });

export function newTally(): Tally {
  return { carriedIn: 0, started: 0, inWork: 0, firstPass: 0, passed: noTimes(), scrapped: noTimes() };
}

export function addTimes(times: Times, parts: CycleParts & { readonly acrossClocks: boolean }): void {
  times.totalMs.push(parts.totalMs);
  times.handsOnMs.push(parts.handsOnMs);
  times.cureMs.push(parts.cureMs);
  times.waitingMs.push(parts.waitingMs);
  if (parts.acrossClocks) times.acrossClocks += 1;
}

/** Totals of several tallies taken together, of one as well. */
export function totalsOf(tallies: readonly Tally[]): Totals {
  const sum = (of: (tally: Tally) => number) => tallies.reduce((all, tally) => all + of(tally), 0);
  const passed = sum((tally) => tally.passed.totalMs.length);
  const scrapped = sum((tally) => tally.scrapped.totalMs.length);
  return {
    carriedIn: sum((tally) => tally.carriedIn),
    started: sum((tally) => tally.started),
    passed,
    scrapped,
    finished: passed + scrapped,
    inWork: sum((tally) => tally.inWork),
    firstPass: ratioOf(
      sum((tally) => tally.firstPass),
      passed + scrapped,
    ),
    cycle: {
      passed: cycleSpread(tallies.map((tally) => tally.passed)),
      scrapped: cycleSpread(tallies.map((tally) => tally.scrapped)),
    },
  };
}

function cycleSpread(parts: readonly Times[]): CycleSpread | null {
  const total = spreadOf(parts.map((times) => times.totalMs));
  const handsOn = spreadOf(parts.map((times) => times.handsOnMs));
  const cure = spreadOf(parts.map((times) => times.cureMs));
  const waiting = spreadOf(parts.map((times) => times.waitingMs));
  if (!total || !handsOn || !cure || !waiting) return null;
  return {
    connectors: parts.reduce((all, times) => all + times.totalMs.length, 0),
    total,
    handsOn,
    cure,
    waiting,
    acrossClocks: parts.reduce((all, times) => all + times.acrossClocks, 0),
  };
}

function spreadOf(lists: readonly (readonly number[])[]): Spread | null {
  const values = new Float64Array(lists.reduce((length, list) => length + list.length, 0));
  let place = 0;
  let sumMs = 0;
  for (const list of lists) {
    values.set(list, place);
    place += list.length;
    for (const value of list) sumMs += value;
  }
  const medianMs = quantileInPlace(values, 0.5);
  const ninetiethPercentileMs = quantileInPlace(values, 0.9);
  return medianMs === null || ninetiethPercentileMs === null ? null : { medianMs, ninetiethPercentileMs, sumMs };
}
