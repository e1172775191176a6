import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { extendBench } from '../../src/bench/extend-bench.ts';
import { foldBench } from '../../src/core/batch/fold.ts';
import type { Bench, Misfit } from '../../src/core/batch/types.ts';
import { decide } from '../../src/core/command/decide.ts';
import { benchWide, type Entry } from '../../src/core/event/entry.ts';
import { verify } from '../../src/core/event/chain.ts';
import { parseLine } from '../../src/core/event/line.ts';
import { clocks } from '../../src/core/timer/clocks.ts';
import { doseNow } from '../../src/core/timer/cure-clock.ts';
import { summaryKey, summaryRow } from '../../src/core/review/summary-row.ts';
import type { BenchLog } from '../../src/bench/bench-log.ts';
import {
  keysIn,
  linesIn,
  newPlace,
  openBatch,
  openIn,
  readSmall,
  restart,
  startOn,
  type Place,
} from '../bench-room/bench-kit.ts';
import { wish, type Wish } from '../bench-room/wishes.ts';

const between = fc.oneof(
  { weight: 6, arbitrary: fc.constant('nothing' as const) },
  { weight: 2, arbitrary: fc.constant('restart' as const) },
  /** The page is loaded on storage that was restored: this tablet writes a new log from here on. */
  { weight: 1, arbitrary: fc.constant('restore' as const) },
  /** The wall clock is set back while the page is closed. */
  { weight: 1, arbitrary: fc.constant('clock back' as const) },
);
/** Mostly minutes, now and then a day, so that mixes and oven entries grow too old to be kept. */
const waitS = fc.oneof(
  { weight: 12, arbitrary: fc.integer({ min: 0, max: 1500 }) },
  { weight: 1, arbitrary: fc.integer({ min: 50_000, max: 100_000 }) },
);
const play = (most: number) =>
  fc.array(fc.record({ wish, waitS, between }), {
    minLength: most / 2,
    maxLength: most,
    size: 'max',
  });

interface Turn {
  readonly wish: Wish;
  readonly waitS: number;
  readonly between: 'nothing' | 'restart' | 'restore' | 'clock back';
}

async function again(place: Place, log: BenchLog, how: Turn['between']): Promise<BenchLog> {
  if (how === 'nothing') return log;
  if (how === 'restore') place.memory.derived.delete('own');
  if (how === 'clock back') place.clock.setWall(place.clock.reading().wall - 1_800_000);
  log.close();
  return restart(place);
}

/** Every entry in the store, in total order; each line is parsed once. */
function reader(place: Place): () => Entry[] {
  const entries: Entry[] = [];
  let count = 0;
  return () => {
    const lines = linesIn(place);
    for (const { text } of lines.slice(count)) {
      const read = parseLine(text);
      if (read.ok) entries.push(read.value);
    }
    count = lines.length;
    return entries;
  };
}

const byId = (a: Misfit, b: Misfit) => (a.entry.log < b.entry.log ? -1 : 1) || a.entry.seq - b.entry.seq;

/** What open work needs of bench-wide state: all of it but the mixes and oven entries that nothing rests on. */
function needed({ wide }: Bench) {
  const { mixes: _some, ovens, misfits, ...rest } = wide;
  const names = Object.values(ovens).map(({ id, name, history }) => ({ id, name, last: history.at(-1) }));
  return { ...rest, names: names.sort((a, b) => (a.id < b.id ? -1 : 1)), misfits: [...misfits].sort(byId) };
}

const doses = (bench: Bench, log: BenchLog) => clocks(bench).map((clock) => doseNow(bench, clock, log.now));

const sorted = (value: unknown): unknown =>
  JSON.parse(JSON.stringify(value), (key, each: unknown) =>
    key === 'batches' && Array.isArray(each) ? [...(each as string[])].sort() : each,
  );

describe('laws of the bench log', () => {
  it('a restart at any time gives the bench of all lines, and everything later is decided the same', async () => {
    const accepted = new Map<string, number>();
    await fc.assert(
      fc.asyncProperty(play(60), async (turns) => {
        const place = newPlace();
        let log = await startOn(place);
        await log.ask({ type: 'set bench', tablet: 'Bench', operators: ['MK'], shifts: [] });
        await log.ask({ type: 'sign on', operator: 'MK', shift: 'early' });
        await openBatch(log, place, 'b1', 3);
        await openBatch(log, place, 'b2', 2);
        const entries = reader(place);
        for (const [index, turn] of turns.entries()) {
          await place.clock.pass(turn.waitS * 1000 + 1);
          log = await again(place, log, turn.between);
          const whole = foldBench(entries(), readSmall);
          const command = turn.wish(whole, `id-${index}`);
          const by = whole.wide.onShift?.operator ?? '';
          const expected = decide(whole, command, { now: log.now, by });
          const answer = await log.ask(command);
          if (expected.ok) {
            const kind = command.type === 'void' && command.batch === benchWide ? 'void of the bench' : command.type;
            accepted.set(kind, (accepted.get(kind) ?? 0) + 1);
            expect(answer.ok, JSON.stringify({ command, answer })).toBe(true);
            const drafts = answer.ok ? answer.value.map(({ batch, type, v, data }) => ({ batch, type, v, data })) : [];
            expect(drafts).toEqual(sorted(expected.value));
          } else expect(sorted(answer)).toEqual(sorted(expected));
          const now = foldBench(entries(), readSmall);
          const tags = Object.values(openIn(now)).map(({ tag }) => tag);
          expect(tags).toEqual([...new Set(tags)]);
          expect(now.wide.misfits).toEqual([]);
          expect(openIn(log.bench)).toEqual(openIn(now));
          expect(needed(log.bench)).toEqual(needed(now));
          expect(clocks(log.bench)).toEqual(clocks(now));
          expect(doses(log.bench, log)).toEqual(doses(now, log));
        }
      }),
      { numRuns: 45 },
    );
    for (const kind of ['undo', 'void', 'void of the bench', 'reopen batch', 'use mix', 'read oven', 'start load']) {
      expect(accepted.get(kind) ?? 0, kind).toBeGreaterThan(0);
    }
  });

  it('every closed batch has one summary row and every open one none, and no line is lost from the chain', async () => {
    await fc.assert(
      fc.asyncProperty(play(40), async (turns) => {
        const place = newPlace();
        let log = await startOn(place);
        await openBatch(log, place, 'b1', 1);
        const entries = reader(place);
        for (const [index, turn] of turns.entries()) {
          await place.clock.pass(turn.waitS * 1000 + 1);
          log = await again(place, log, turn.between);
          await log.ask(turn.wish(foldBench(entries(), readSmall), `id-${index}`));
        }
        const { batches } = foldBench(entries(), readSmall);
        const rows = Object.values(batches).flatMap((batch) => summaryRow(batch) ?? []);
        expect(keysIn(place, 'summary:')).toEqual(rows.map(summaryKey).sort());
        expect(await log.summaryRows(0)).toHaveLength(rows.length);
        for (const report of verify(linesIn(place)).values()) expect(report.state).toBe('unbroken');
      }),
      { numRuns: 25 },
    );
  });

  it('what is added piece by piece gives the same bench as all at once', async () => {
    let taken = 0;
    const pieces = fc.tuple(play(40), fc.array(fc.integer({ min: 1, max: 5 }), { minLength: 1, maxLength: 20 }));
    await fc.assert(
      fc.asyncProperty(pieces, async ([turns, sizes]) => {
        const place = newPlace();
        let log = await startOn(place);
        await openBatch(log, place, 'b1', 3);
        const read = reader(place);
        for (const [index, turn] of turns.entries()) {
          await place.clock.pass(turn.waitS * 1000 + 1);
          log = await again(place, log, turn.between);
          await log.ask(turn.wish(foldBench(read(), readSmall), `id-${index}`));
        }
        const entries = read();
        let grown = foldBench([], readSmall);
        for (let at = 0, turn = 0; at < entries.length; turn += 1) {
          const size = sizes[turn % sizes.length] ?? 1;
          grown = extendBench(grown, entries.slice(at, at + size), readSmall);
          at += size;
        }
        const whole = foldBench(entries, readSmall);
        expect(grown.batches).toEqual(whole.batches);
        expect(grown.wide).toEqual(whole.wide);
        expect(grown.entries).toEqual(whole.entries);
        taken += whole.entries[benchWide]?.filter(({ type }) => type === 'voided').length ?? 0;
      }),
      { numRuns: 25 },
    );
    expect(taken).toBeGreaterThan(0);
  });
});
