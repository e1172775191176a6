import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { Entry } from '../../src/core/event/entry.ts';
import { parseLine } from '../../src/core/event/line.ts';
import { compareEntries, dedupe, inOrder } from '../../src/core/event/order.ts';
import { held, noonMs, written } from '../core/event/written.ts';

/** Entries of several logs whose wall clocks stand close, stand still and fall back, so that times collide. */
const entries = fc
  .uniqueArray(fc.constantFrom('log-a', 'log-b', 'log-c', 'log-ä', 'log-a2'), { minLength: 1, maxLength: 5 })
  .chain((logs) =>
    fc.tuple(
      ...logs.map((log) =>
        fc
          .tuple(fc.integer({ min: 1, max: 6 }), fc.integer({ min: -2000, max: 2000 }))
          .map(([count, offMs]) => entriesOf(log, count, noonMs + offMs)),
      ),
    ),
  )
  .map((perLog) => perLog.flat());

function entriesOf(log: string, count: number, wall: number): Entry[] {
  const drafts = Array.from({ length: count }, (_, index) => held(`b${index}`, `held ${index} on ${log}`));
  return written(drafts, { log, wall }).lines.flatMap((line) => {
    const read = parseLine(line.text);
    return read.ok ? [read.value] : [];
  });
}

/** The same entries shuffled, with any of them again. */
const arrivals = entries.chain((set) =>
  fc
    .tuple(fc.shuffledSubarray(set, { minLength: set.length }), fc.array(fc.constantFrom(...set), { maxLength: 10 }))
    .chain(([shuffled, again]) =>
      fc
        .shuffledSubarray([...shuffled, ...again.map((entry) => structuredClone(entry))], {
          minLength: set.length + again.length,
        })
        .map((arrived) => ({ set, arrived })),
    ),
);

test('law: any arrival order and any duplication give the same list', () => {
  fc.assert(
    fc.property(arrivals, ({ set, arrived }) => {
      expect(inOrder(arrived)).toEqual(inOrder(set));
      expect(inOrder(arrived)).toHaveLength(set.length);
    }),
    { numRuns: 150 },
  );
});

test('law: the order is total: no two different entries are equal, and each triple is consistent', () => {
  fc.assert(
    fc.property(entries, (set) => {
      for (const a of set) {
        for (const b of set) {
          expect(Math.sign(compareEntries(a, b)) + Math.sign(compareEntries(b, a))).toBe(0);
          if (a !== b) expect(compareEntries(a, b)).not.toBe(0);
          for (const c of set) {
            if (compareEntries(a, b) < 0 && compareEntries(b, c) < 0) expect(compareEntries(a, c)).toBeLessThan(0);
          }
        }
      }
    }),
    { numRuns: 20 },
  );
});

test('law: the entries of one log keep the order in which they were written', () => {
  fc.assert(
    fc.property(arrivals, ({ arrived }) => {
      const lastSeq = new Map<string, number>();
      for (const { log, seq } of inOrder(arrived)) {
        expect(seq).toBe((lastSeq.get(log) ?? 0) + 1);
        lastSeq.set(log, seq);
      }
    }),
    { numRuns: 200 },
  );
});

test('time comes before log, and log before seq', () => {
  const entry = (time: string, log: string, seq: number) => ({ time, log, seq });
  const first = entry('1764676800000.00000', 'z', 9);
  const second = entry('1764676800000.00001', 'a', 9);
  const third = entry('1764676800000.00001', 'b', 1);
  const fourth = entry('1764676800000.00001', 'b', 2);
  expect(inOrder([fourth, third, second, first])).toEqual([first, second, third, fourth]);
});

test('the list that is given stays as it was', () => {
  const given = [...entriesOf('log-a', 3, noonMs)].reverse();
  const before = [...given];
  inOrder(given);
  dedupe(given);
  expect(given).toEqual(before);
});
