import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { BenchState } from '../../src/bench/bench-state.svelte.ts';
import { ShiftReport } from '../../src/bench/shift-report.svelte.ts';
import type { BenchLog } from '../../src/bench/bench-log.ts';
import { settled } from '../fake/clock.ts';
import { from } from '../fake/script.ts';
import { granted, keysIn, newPlace, openBatch, restart, startOn, type Place } from './bench-kit.ts';

const start = Date.UTC(2026, 0, 12, 8);

/** One batch of three whose connectors go from strip to scrap at once: the shortest way to a closed batch. */
async function scrapped(log: BenchLog, place: Place, batch: string): Promise<void> {
  await openBatch(log, place, batch, 3);
  await granted(
    log,
    place,
    { type: 'scrap', batch, connectors: from(1, 3), defect: 'crack' },
    { type: 'close batch', batch },
  );
}

describe('rows of closed batches', () => {
  test('those that can tell of a time or later, read after what is being written', async () => {
    const place = newPlace(start);
    const log = await startOn(place);
    await scrapped(log, place, 'b1');
    await openBatch(log, place, 'b2', 1);
    await granted(log, place, { type: 'scrap', batch: 'b2', connectors: [1], defect: 'crack' });
    const closing = log.ask({ type: 'close batch', batch: 'b2' });
    const rows = await log.summaryRows(start);
    expect((await closing).ok).toBe(true);
    expect(rows.map(({ batch }) => batch).sort()).toEqual(['b1', 'b2']);
    expect(await log.summaryRows(start + 24 * 3_600_000)).toEqual([]);
  });

  test.each([['{'], ['{"version":0}'], ['{"version":1}']])(
    'the row %s is made anew from the lines',
    async (damaged) => {
      const place = newPlace(start);
      const log = await startOn(place);
      await scrapped(log, place, 'b:1');
      const before = await log.summaryRows(start);
      for (const key of keysIn(place, 'summary:')) place.memory.derived.set(key, { key, value: damaged });
      const after = await (await restart(place)).summaryRows(start);
      expect(after).toEqual(before);
      expect(after).toHaveLength(1);
    },
  );
});

describe('the numbers of the running shift', () => {
  beforeEach(() => void vi.stubEnv('TZ', 'UTC'));
  afterEach(() => void vi.unstubAllEnvs());

  test('count what finished in batches at hand and in those closed before the page began', async () => {
    const place = newPlace(start);
    const first = await startOn(place);
    await openBatch(first, place, 'b1', 2);
    await granted(
      first,
      place,
      { type: 'finish step', batch: 'b1', step: 'strip', connectors: [1, 2] },
      { type: 'send back', batch: 'b1', connectors: [2], to: 'strip', defect: 'scratch' },
      { type: 'scrap', batch: 'b1', connectors: [1, 2], defect: 'crack' },
      { type: 'close batch', batch: 'b1' },
    );
    const log = await restart(place);
    const state = new BenchState(log);
    const report = new ShiftReport(state);
    await vi.waitFor(() => expect(state.shiftSoFar).not.toBeNull());
    expect(state.bench.batches).toEqual({});
    expect(state.shiftSoFar).toEqual({ passed: 0, sentBack: 1 });
    expect(report.summary).toMatchObject({ scrapped: 2, inWork: 0, started: 2 });

    await openBatch(log, place, 'b2', 2);
    await granted(
      log,
      place,
      { type: 'finish step', batch: 'b2', step: 'strip', connectors: [1, 2] },
      { type: 'send back', batch: 'b2', connectors: [1], to: 'strip', defect: 'scratch' },
    );
    state.tick();
    expect(state.shiftSoFar).toEqual({ passed: 0, sentBack: 2 });
    expect(report.summary).toMatchObject({ scrapped: 2, inWork: 2, started: 4 });
    expect(report.batches.get('b1')?.workOrder).toBe('WO b1');

    await granted(
      log,
      place,
      { type: 'scrap', batch: 'b2', connectors: [1, 2], defect: 'crack' },
      { type: 'close batch', batch: 'b2' },
    );
    // Not for a moment does the batch that closed fall out of the numbers, and not twice does it count.
    expect(state.shiftSoFar).toEqual({ passed: 0, sentBack: 2 });
    await settled();
    expect(state.shiftSoFar).toEqual({ passed: 0, sentBack: 2 });
    expect(report.summary).toMatchObject({ scrapped: 4, inWork: 0 });
  });
});
