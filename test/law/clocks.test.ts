import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Batch, Bench, OvenHappening } from '../../src/core/batch/types.ts';
import { alarms, urgencies, type Raised } from '../../src/core/timer/alarm.ts';
import type { Clock } from '../../src/core/timer/clock.ts';
import { clocks } from '../../src/core/timer/clocks.ts';
import { doseNow } from '../../src/core/timer/cure-clock.ts';
import {
  attention,
  attentionRanks,
  byAttention,
  compareAttention,
  type Attention,
} from '../../src/core/timer/order.ts';
import { readClock } from '../../src/core/timer/reading.ts';
import { shifted, type Moment } from '../../src/core/unit/moment.ts';
import { from, Script } from '../fake/script.ts';

const runs = { numRuns: 200 };
const tenMs = 1_000_000_000_000;
const second = (seconds: number): Moment => ({ log: 'a', bench: tenMs + seconds * 1000, wall: tenMs + seconds * 1000 });

const base = { batch: 'b', tag: 1, step: 1, from: second(0), earliest: null, uncertain: false };
const seen = fc.option(fc.integer({ min: 0, max: 8000 }));
const seenFields = (seenS: number | null) => ({ seen: seenS !== null, seenAt: seenS === null ? null : second(seenS) });
const clock: fc.Arbitrary<Clock> = fc
  .record({
    id: fc.stringMatching(/^[a-z]{1,8}$/),
    kind: fc.constantFrom('at least' as const, 'at most' as const, 'aim' as const),
    dueS: fc.integer({ min: 1, max: 5000 }),
    moreS: fc.integer({ min: 0, max: 3000 }),
    never: fc.boolean(),
    seenS: seen,
  })
  .map(({ id, kind, dueS, moreS, never, seenS }): Clock => {
    const common = { ...base, ...seenFields(seenS), id, kind };
    if (kind === 'at most') {
      const about = { type: 'working life', mix: 'm', lot: 'l', connectors: 1, limitStep: 1 } as const;
      return { ...common, about, due: second(dueS), over: second(dueS) };
    }
    if (kind === 'aim') {
      const about = { type: 'polish', load: 'l', filmUm: 1 } as const;
      const toleranceS = Math.min(moreS, dueS);
      return {
        ...common,
        about,
        due: second(dueS),
        over: second(dueS + toleranceS),
        earliest: second(dueS - toleranceS),
      };
    }
    const about = { type: 'wait', load: 'l' } as const;
    return { ...common, about, due: never ? null : second(dueS), over: never ? null : second(dueS + moreS) };
  });
const times = fc
  .array(fc.integer({ min: 0, max: 9000 }), { minLength: 2, maxLength: 30 })
  .map((list) => list.sort((a, b) => a - b));

describe('a clock, as time goes on', () => {
  test('never goes back to an earlier state, and its share never falls', () => {
    const states = ['running', 'soon', 'done', 'over'];
    fc.assert(
      fc.property(clock, times, (one, seconds) => {
        const readings = seconds.map((at) => readClock(one, second(at)));
        for (const [index, reading] of readings.entries()) {
          const before = readings[index - 1] ?? reading;
          expect(states.indexOf(reading.state)).toBeGreaterThanOrEqual(states.indexOf(before.state));
          expect(reading.share).toBeGreaterThanOrEqual(before.share);
          expect(reading.leftMs).toBeLessThanOrEqual(before.leftMs);
          expect(reading.share >= 0 && reading.share <= 1).toBe(true);
        }
      }),
      runs,
    );
  });

  test('calls afresh at most once for each stage, and only later stages once it was seen', () => {
    fc.assert(
      fc.property(clock, times, (one, seconds) => {
        let raised: Raised = {};
        const fresh = seconds.flatMap((at) => {
          const looked = alarms([one], second(at), raised);
          raised = looked.raised;
          for (const { lateMs } of looked.alarms) expect(lateMs).toBeGreaterThanOrEqual(0);
          return looked.alarms.filter((alarm) => alarm.fresh).map((alarm) => urgencies.indexOf(alarm.urgency));
        });
        expect(fresh).toEqual([...new Set(fresh)].sort());
      }),
      runs,
    );
  });

  test('calls in the end, unless it is never due or was seen when it was over', () => {
    fc.assert(
      fc.property(clock, (one) => {
        const [alarm] = alarms([one], second(20_000), {}).alarms;
        const seenWhenOver = one.seenAt !== null && readClock(one, one.seenAt).state === 'over';
        expect(alarm?.urgency).toBe(one.due === null || seenWhenOver ? undefined : 'over');
      }),
      runs,
    );
  });
});

describe('order of attention', () => {
  const key: fc.Arbitrary<Attention> = fc.record({
    rank: fc.constantFrom(...attentionRanks),
    leftMs: fc.oneof(fc.integer({ min: -50, max: 50 }), fc.constant(Infinity)),
  });

  test('is a total order', () => {
    fc.assert(
      fc.property(key, key, key, (a, b, c) => {
        expect(Math.sign(compareAttention(a, b)) + Math.sign(compareAttention(b, a))).toBe(0);
        if (compareAttention(a, b) <= 0 && compareAttention(b, c) <= 0) {
          expect(compareAttention(a, c)).toBeLessThanOrEqual(0);
        }
      }),
      runs,
    );
  });

  test('does not depend on the order in which clocks come, and over always leads', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(clock, { maxLength: 20, selector: ({ id }) => id }),
        fc.integer({ min: 0, max: 9000 }),
        (list, at) => {
          const readings = list.map((one) => readClock(one, second(at)));
          const sorted = byAttention(readings);
          expect(byAttention([...readings].reverse())).toEqual(sorted);
          const overs = sorted.map(({ state }) => state === 'over');
          expect(overs).toEqual([...overs].sort((a, b) => Number(b) - Number(a)));
          if (sorted[0]) expect(attention(readings, false)).toEqual(attention([sorted[0]], false));
        },
      ),
      runs,
    );
  });
});

/** Ten open batches of twenty connectors, each connector a load of its own in the oven: 200 clocks. */
function fullBench(oven: readonly OvenHappening[]): Bench {
  const script = new Script().open('seed', 20);
  const seed = script.batch('seed');
  const cure = seed.recipe.steps.findIndex(({ kind }) => kind === 'cure');
  const batches = from(1, 10).map((tag): Batch => ({
    ...seed,
    id: `batch-${tag}`,
    tag,
    loads: from(1, 20).map((number) => ({
      id: `load-${tag}-${number}`,
      step: cure,
      connectors: [number],
      station: 'oven-1',
      from: shifted(script.now, -(tag * 20 + number) * 1000),
      ended: null,
    })),
  }));
  const { wide, entries } = script.bench;
  return {
    entries,
    wide: { ...wide, ovens: { 'oven-1': { id: 'oven-1', name: 'Oven 1', history: oven } } },
    batches: Object.fromEntries(batches.map((batch) => [batch.id, batch])),
  };
}

describe('two hundred clocks', () => {
  const { now } = new Script();
  const entry = { log: 'log-a', seq: 1 };
  const told: OvenHappening[] = [
    { kind: 'set', setPointC: 100, warmUpS: 300, at: shifted(now, -3_600_000), entry },
    { kind: 'door opened', at: shifted(now, -60_000), entry },
    { kind: 'read', temperatureC: 92, at: shifted(now, -30_000), entry },
  ];

  test('are all there, each with its own id, whatever the order of the batches', () => {
    const bench = fullBench(told);
    const all = clocks(bench);
    expect(new Set(all.map(({ id }) => id)).size).toBe(200);
    expect(Math.max(...all.map(({ id }) => id.length))).toBeLessThanOrEqual(64);
    const turned = { ...bench, batches: Object.fromEntries(Object.entries(bench.batches).reverse()) };
    expect(clocks(turned)).toEqual(all);
  });

  test('are due when their dose is one, and not two milliseconds before', () => {
    const bench = fullBench(told);
    for (const one of clocks(bench)) {
      if (!one.due) throw new Error('never due');
      expect(doseNow(bench, one, one.due)?.dose).toBeGreaterThanOrEqual(1);
      expect(doseNow(bench, one, shifted(one.due, -2))?.dose).toBeLessThan(1);
    }
  });

  test('look at each entry of their oven once for each load, and not at what lies days back', () => {
    let looked = 0;
    const old = Array.from({ length: 2000 }, (_, day): OvenHappening => ({
      kind: 'set',
      setPointC: 100,
      warmUpS: null,
      at: shifted(now, -(2000 - day + 2) * 86_400_000),
      entry,
    }));
    const counted = new Proxy([...old, ...told], {
      get(target, key, receiver) {
        if (typeof key === 'string' && /^\d+$/.test(key)) looked += 1;
        return Reflect.get(target, key, receiver) as unknown;
      },
    });
    expect(clocks(fullBench(counted))).toHaveLength(200);
    expect(looked).toBe(200 * (told.length + 1));
  });
});
