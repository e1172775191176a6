import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { benchNow, benchOf, elapsedMs } from '../../../src/core/event/bench-time.ts';
import type { Fact } from '../../../src/core/event/facts.ts';
import { anyDraft } from './arbitrary-facts.ts';
import { noonMs } from './written.ts';

const noon = noonMs;
const minute = 60_000;
const point = { bench: noon, wall: noon, mono: 500_000, page: 'p1' };
const at = (wallMs: number, monoMs: number, page = 'p1') => ({ wall: noon + wallMs, mono: 500_000 + monoMs, page });

const held: Fact = { type: 'batchHeld', v: 1, data: { reason: 'lunch' } };
const clockSet: Fact = { type: 'clockSet', v: 1, data: {} };
const woke: Fact = { type: 'tabletWoke', v: 1, data: {} };
const started: Fact = { type: 'tabletStarted', v: 1, data: { app: '0.1.0' } };
const stated = (addedS: number): Fact => ({ type: 'timeStated', v: 1, data: { addedS } });

describe('what counts as passed', () => {
  test.each([
    {
      what: 'an ordinary entry: the monotonic clock',
      fact: held,
      reading: at(9 * minute, 10 * minute),
      ms: 10 * minute,
    },
    {
      what: 'a clock set back an hour: the monotonic clock',
      fact: clockSet,
      reading: at(-60 * minute, minute),
      ms: minute,
    },
    { what: 'a clock set forward: the monotonic clock', fact: clockSet, reading: at(60 * minute, minute), ms: minute },
    {
      what: 'a sleep that stopped the monotonic clock: the wall clock',
      fact: woke,
      reading: at(30 * minute, 2),
      ms: 30 * minute,
    },
    {
      what: 'a sleep with the clock set back: the monotonic clock',
      fact: woke,
      reading: at(-minute, minute),
      ms: minute,
    },
    { what: 'a start: the wall clock', fact: started, reading: at(20 * minute, -400_000, 'p2'), ms: 20 * minute },
    {
      what: 'a start: the wall clock, whatever the page says of its own',
      fact: started,
      reading: at(20 * minute, 5 * minute),
      ms: 20 * minute,
    },
    { what: 'a start with the wall clock behind: nothing', fact: started, reading: at(-minute, -400_000, 'p2'), ms: 0 },
    {
      what: 'a stated time: the monotonic clock and what was added',
      fact: stated(600),
      reading: at(0, minute),
      ms: 11 * minute,
    },
    { what: 'a stated time to the ms', fact: stated(0.0014), reading: at(0, 0), ms: 1 },
    { what: 'another page without a start: the wall clock', fact: held, reading: at(minute, 7, 'p2'), ms: minute },
  ])('$what', ({ fact, reading, ms }) => {
    expect(elapsedMs(point, fact, reading)).toBe(ms);
    expect(benchOf(point, fact, reading)).toBe(noon + ms);
  });
});

test('a log begins at what the wall clock shows', () => {
  expect(benchOf(null, started, at(0, 0))).toBe(noon);
  expect(benchOf(null, stated(600), at(0, 0))).toBe(noon);
});

test('now is the last line and what passed since', () => {
  expect(benchNow(point, at(-60 * minute, minute))).toBe(noon + minute);
  expect(benchNow(point, at(3 * minute, 20, 'p2'))).toBe(noon + 3 * minute);
});

test('law: bench time never falls, whatever the clocks do', () => {
  const clock = fc.integer({ min: 0, max: 4_000_000_000_000 });
  const reading = fc.record({ wall: clock, mono: clock, page: fc.constantFrom('p1', 'p2') });
  fc.assert(
    fc.property(fc.array(fc.tuple(anyDraft, reading), { minLength: 2, maxLength: 20 }), (entries) => {
      let last: typeof point | null = null;
      for (const [fact, clocks] of entries) {
        const bench: number = benchOf(last, fact, clocks);
        if (last !== null) expect(bench).toBeGreaterThanOrEqual(last.bench);
        last = { ...clocks, bench };
      }
    }),
    { numRuns: 200 },
  );
});
