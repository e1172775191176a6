import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Batch } from '../../src/core/batch/types.ts';
import { cycleOf } from '../../src/core/review/cycle.ts';
import { shiftOf, type ShiftSummary } from '../../src/core/review/shift.ts';
import { summaryKey, summaryKeysFrom, summaryRow, type SummaryRow } from '../../src/core/review/summary-row.ts';
import type { CycleSpread, Totals } from '../../src/core/review/tally.ts';
import { earliestMs, randomBatches } from '../core/review/random-batches.ts';

const runs = { numRuns: 120 };
const hourMs = 3_600_000;

type Borders = readonly [number, number, number];

/** Three borders in order: full hours around everything that happens, or the very instants at which something does. */
const bordersOf = (batches: readonly Batch[], dice: readonly number[]): Borders => {
  const instants = batches.flatMap(({ opened, connectors, loads }) => [
    opened.wall,
    ...connectors.map(({ since }) => since.wall),
    ...loads.flatMap(({ ended }) => ended?.at.wall ?? []),
  ]);
  const [a = 0, b = 0, c = 0] = dice
    .map(
      (die) => (die % 2 === 0 ? instants[die % instants.length] : undefined) ?? earliestMs + ((die % 54) - 6) * hourMs,
    )
    .sort((one, other) => one - other);
  return [a, b, c];
};
const dice = fc.array(fc.nat(9999), { minLength: 3, maxLength: 3 });

const rowsOf = (batches: readonly Batch[]): SummaryRow[] => batches.flatMap((batch) => summaryRow(batch) ?? []);
const openOf = (batches: readonly Batch[]): Batch[] => batches.filter(({ closed }) => !closed);

/** What the review of a window gets from a store: the rows that its key range finds, and the open batches. */
function review(batches: readonly Batch[], fromWallMs: number, toWallMs: number): ShiftSummary {
  const { lower, upper } = summaryKeysFrom(fromWallMs);
  const rows = rowsOf(batches).filter((row) => lower <= summaryKey(row) && summaryKey(row) < upper);
  return shiftOf(rows, openOf(batches), fromWallMs, toWallMs);
}

const parts = ['total', 'handsOn', 'cure', 'waiting'] as const;
const sums = (cycle: CycleSpread | null) => parts.map((part) => cycle?.[part].sumMs ?? 0);
const addUp = (a: readonly number[], b: readonly number[]) => a.map((value, index) => value + (b[index] ?? 0));

/** All that adds up over windows and over recipes. */
const countsOf = ({ passed, scrapped, finished, firstPass, cycle }: Totals) => [
  passed,
  scrapped,
  finished,
  firstPass?.count ?? 0,
  firstPass?.of ?? 0,
  ...sums(cycle.passed),
  ...sums(cycle.scrapped),
];

describe('shift totals add up', () => {
  test('passed + scrapped + in work = all connectors, counted from the connectors themselves', () => {
    fc.assert(
      fc.property(randomBatches, (batches) => {
        const shift = review(batches, -Infinity, Infinity);
        const all = batches.flatMap(({ connectors }) => connectors);
        const standing = (at: string) => all.filter(({ stands }) => stands.at === at).length;
        expect(shift.passed).toBe(standing('passed'));
        expect(shift.scrapped).toBe(standing('scrapped'));
        expect(shift.inWork).toBe(standing('step') + standing('load'));
        expect(shift.passed + shift.scrapped + shift.inWork).toBe(all.length);
      }),
      runs,
    );
  });

  test('carried in + started = passed + scrapped + in work, in any window and recipe', () => {
    fc.assert(
      fc.property(randomBatches, dice, (batches, thrown) => {
        const [from, , to] = bordersOf(batches, thrown);
        const shift = review(batches, from, to);
        for (const totals of [shift, ...shift.byRecipe]) {
          expect(totals.carriedIn + totals.started).toBe(totals.passed + totals.scrapped + totals.inWork);
        }
      }),
      runs,
    );
  });

  test('the parts of every cycle time sum to it, none is negative, and it spans opening to end', () => {
    fc.assert(
      fc.property(randomBatches, (batches) => {
        for (const batch of batches) {
          for (const connector of batch.connectors) {
            const { totalMs, handsOnMs, cureMs, waitingMs } = cycleOf(batch, connector);
            expect(handsOnMs + cureMs + waitingMs).toBe(totalMs);
            expect(Math.min(handsOnMs, cureMs, waitingMs)).toBeGreaterThanOrEqual(0);
            const { opened } = batch;
            const ended = connector.since;
            const spanMs = ended.log === opened.log ? ended.bench - opened.bench : ended.wall - opened.wall;
            expect(totalMs).toBe(Math.max(0, spanMs));
          }
        }
      }),
      runs,
    );
  });

  test('by recipe sums to all', () => {
    fc.assert(
      fc.property(randomBatches, dice, (batches, thrown) => {
        const [from, , to] = bordersOf(batches, thrown);
        const shift = review(batches, from, to);
        const withOpen = (totals: Totals) => [
          ...countsOf(totals),
          totals.inWork,
          totals.carriedIn,
          totals.started,
          totals.cycle.passed?.acrossClocks ?? 0,
        ];
        const summed = shift.byRecipe.map(withOpen).reduce(
          addUp,
          withOpen(shift).map(() => 0),
        );
        expect(summed).toEqual(withOpen(shift));
      }),
      runs,
    );
  });

  test('two adjacent windows sum to the window over both', () => {
    fc.assert(
      fc.property(randomBatches, dice, (batches, thrown) => {
        const [from, middle, to] = bordersOf(batches, thrown);
        const first = review(batches, from, middle);
        const second = review(batches, middle, to);
        const both = review(batches, from, to);
        expect(addUp(countsOf(first), countsOf(second))).toEqual(countsOf(both));
        expect(first.started + second.started).toBe(both.started);
        expect(second.carriedIn).toBe(first.inWork);
        expect([first.carriedIn, second.inWork]).toEqual([both.carriedIn, both.inWork]);
        expect([...first.lateness, ...second.lateness].length).toBe(both.lateness.length);
        for (const list of ['sendBacks', 'scraps'] as const) {
          const total = (shift: ShiftSummary) => shift[list].reduce((sum, { connectors }) => sum + connectors, 0);
          expect(total(first) + total(second)).toBe(total(both));
        }
      }),
      runs,
    );
  });

  test('every scrapped connector has its cause, and no median lies outside its values', () => {
    fc.assert(
      fc.property(randomBatches, dice, (batches, thrown) => {
        const [from, , to] = bordersOf(batches, thrown);
        const shift = review(batches, from, to);
        expect(shift.scraps.reduce((sum, { connectors }) => sum + connectors, 0)).toBe(shift.scrapped);
        const total = shift.cycle.passed?.total;
        if (total) expect(total.medianMs).toBeLessThanOrEqual(total.ninetiethPercentileMs);
      }),
      runs,
    );
  });

  test('rows in any order, and a batch read from its row or from its state, give the same shift', () => {
    fc.assert(
      fc.property(randomBatches, dice, (batches, thrown) => {
        const [from, , to] = bordersOf(batches, thrown);
        const shift = shiftOf(rowsOf(batches), openOf(batches), from, to);
        expect(shiftOf(rowsOf(batches).reverse(), openOf(batches).reverse(), from, to)).toEqual(shift);
        expect(shiftOf([], batches, from, to)).toEqual(shift);
      }),
      runs,
    );
  });

  test('the random batches are worth the name: they reach every outcome', () => {
    const seen = new Set<string>();
    for (const batches of fc.sample(randomBatches, { numRuns: 120, seed: 7 })) {
      const shift = review(batches, -Infinity, Infinity);
      if (shift.passed > 0) seen.add('passed');
      if (shift.scrapped > 0) seen.add('scrapped');
      if (shift.inWork > 0) seen.add('in work');
      if ((shift.firstPass?.count ?? 0) > 0) seen.add('first pass');
      if (shift.passed > (shift.firstPass?.count ?? 0)) seen.add('passed later');
      if (shift.sendBacks.length > 0) seen.add('sent back');
      if (shift.byRecipe.length > 1) seen.add('two recipes');
      if ((shift.cycle.passed?.acrossClocks ?? 0) > 0) seen.add('two tablets');
      if (shift.lateness.some(({ clock }) => clock.kind === 'working life')) seen.add('overrun');
      if (rowsOf(batches).length > 0 && openOf(batches).length > 0) seen.add('open and closed');
    }
    expect([...seen].sort()).toEqual([
      'first pass',
      'in work',
      'open and closed',
      'overrun',
      'passed',
      'passed later',
      'scrapped',
      'sent back',
      'two recipes',
      'two tablets',
    ]);
  });
});
