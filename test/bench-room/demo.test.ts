import { beforeAll, describe, expect, it } from 'vitest';
import { BenchLog } from '../../src/bench/bench-log.ts';
import { byNeed } from '../../src/bench/batch-view.ts';
import { fillDemo } from '../../src/bench/demo/fill-demo.ts';
import { groupsOf } from '../../src/core/batch/groups.ts';
import { verify } from '../../src/core/event/chain.ts';
import { readTakenRecipe } from '../../src/core/recipe/parse.ts';
import { shiftWindow } from '../../src/core/review/shift-window.ts';
import { shiftOf } from '../../src/core/review/shift.ts';
import { clocks } from '../../src/core/timer/clocks.ts';
import { doseNow } from '../../src/core/timer/cure-clock.ts';
import { byAttention } from '../../src/core/timer/order.ts';
import { readClock } from '../../src/core/timer/reading.ts';
import { emptyMemory, memoryStore } from '../../src/log/memory-store.ts';
import type { LogStore } from '../../src/log/store.ts';
import { fakeClock } from '../fake/clock.ts';
import { countedIds } from './bench-kit.ts';

const offset = 60;

/** A page that finds the demo's database empty at this wall time, fills it and starts. */
async function demoAt(wallMs: number) {
  const memory = emptyMemory();
  let appends = 0;
  const kept = memoryStore(memory);
  const store: LogStore = {
    ...kept,
    append: (...asked) => {
      appends += 1;
      return kept.append(...asked);
    },
  };
  const reading = fakeClock(wallMs);
  const clock = { stamp: () => ({ ...reading.reading(), offset, zone: 'Europe/Berlin' }) };
  const options = { store, clock, randomId: countedIds(), readRecipe: readTakenRecipe, app: 'test' };
  await fillDemo(options);
  const filled = appends;
  const log = await BenchLog.start(options);
  return { log, store, memory, filled };
}

const rounded = (ms: number) => Math.round(ms / 1000);

describe.each([
  ['an afternoon', Date.UTC(2026, 0, 12, 13, 40, 0)],
  ['shortly after midnight', Date.UTC(2026, 2, 1, 0, 3, 17)],
])('the demo shift, opened in %s', (_, wallMs) => {
  let demo: Awaited<ReturnType<typeof demoAt>>;
  beforeAll(async () => {
    demo = await demoAt(wallMs);
  });

  it('is a log like any other: unbroken, and every entry fits', async () => {
    expect([...verify(await demo.store.lines()).values()].map(({ state }) => state)).toEqual(['unbroken']);
    expect(demo.log.misfits).toEqual([]);
    expect(demo.log.unreadable).toEqual([]);
    expect(demo.log.head?.seq).toBe(await demo.store.count());
  });

  it('is written with one append, which the next start goes on from', () => {
    expect(demo.filled).toBe(1);
    expect([...demo.memory.heads.keys()]).toHaveLength(1);
  });

  it('begins with the shift and ends now, in order, with nobody at two places in one instant', async () => {
    const entries = (await demo.store.lines()).map(({ text }) => JSON.parse(text) as { wall: number; mono: number });
    const walls = entries.slice(0, -1).map(({ wall }) => wall);
    expect(walls).toEqual([...walls].sort((a, b) => a - b));
    expect(rounded((walls[0] ?? 0) - wallMs)).toBe(-(7 * 3600 + 40 * 60));
    expect((walls.at(-1) ?? 0) <= wallMs).toBe(true);
    const { wide } = demo.log.bench;
    expect(wide.tablet).toBe('Demo bench');
    expect(wide.operators).toEqual(['AB', 'KT']);
    expect(Object.keys(wide.ovens)).toHaveLength(2);
    const window = shiftWindow(wide.shifts, wallMs, () => offset);
    expect(window.name).toBe(wide.onShift?.shift);
    expect(Math.abs((walls[0] ?? 0) - window.fromWallMs)).toBeLessThanOrEqual(5 * 60_000);
  });

  it('has clocks of every kind running at once', () => {
    const { bench, now } = demo.log;
    const told = byAttention(clocks(bench).map((clock) => readClock(clock, now))).map(({ clock, state, leftMs }) => {
      const dose = doseNow(bench, clock, now);
      return [clock.about.type, state, dose ? Math.round(dose.dose * 100) : rounded(leftMs)];
    });
    expect(told).toEqual([
      ['polish', 'running', 27],
      ['working life', 'running', 36 * 60],
      ['cure', 'done', 103],
      ['cure', 'running', 41],
    ]);
    const waits = clocks(bench).map((clock) => readClock(clock, now));
    expect(waits.filter(({ state }) => state === 'done').map(({ leftMs }) => rounded(leftMs))).toEqual([-40]);
    const cold = clocks(bench).flatMap(({ about }) => (about.type === 'cure' ? [about.why] : []));
    expect(cold).toContainEqual(expect.objectContaining({ kind: 'oven read', temperatureC: 98 }));
  });

  it('has four open batches, one of them with a connector that was sent back', () => {
    const { bench, now } = demo.log;
    const readings = clocks(bench).map((clock) => readClock(clock, now));
    const rows = byNeed(Object.values(bench.batches), readings);
    expect(rows.map(({ batch }) => [batch.closed, batch.tag])).toHaveLength(4);
    const polishing = rows[0]?.batch;
    const groups = polishing ? groupsOf(polishing) : [];
    expect(groups.map(({ at, connectors }) => [at, connectors.length])).toEqual([
      ['step', 1],
      ['load', 11],
    ]);
    expect(groups[0]?.connectors[0]).toMatchObject({ reworks: 1, attempt: 1 });
  });

  it('has one closed batch with a rework and a scrap, which the shift counts', async () => {
    const rows = await demo.log.summaryRows(0);
    expect(rows).toHaveLength(1);
    const { fromWallMs, toWallMs } = shiftWindow(demo.log.bench.wide.shifts, wallMs, () => offset);
    const shift = shiftOf(rows, Object.values(demo.log.bench.batches), fromWallMs, toWallMs);
    expect([shift.passed, shift.scrapped]).toEqual([5, 1]);
    expect(rows[0]?.connectors.filter(({ reworks }) => reworks > 0)).toHaveLength(1);
    expect(shift.sendBacks.map(({ connectors }) => connectors)).toEqual([2]);
  });
});

it('is there within two seconds', async () => {
  const begun = process.hrtime.bigint();
  await demoAt(Date.UTC(2026, 0, 12, 13, 40, 0));
  expect(Number(process.hrtime.bigint() - begun) / 1e6).toBeLessThan(2000);
});
