import { beforeAll, describe, expect, it } from 'vitest';
import { benchWide, type Draft } from '../../src/core/event/entry.ts';
import { sha256 } from '../../src/core/event/hash.ts';
import { makeLines } from '../../src/core/event/line.ts';
import { memoryStore } from '../../src/log/memory-store.ts';
import type { LogStore } from '../../src/log/store.ts';
import { codeOf, granted, newPlace, openBatch, restart, smallText, startOn, type Place } from './bench-kit.ts';

const lineCount = 20_000;

/** A log of closed batches alone, as long as a year of work. */
async function yearOfWork(): Promise<Place> {
  const place = newPlace();
  const recipe = sha256(smallText);
  const drafts: Draft[] = [
    { batch: benchWide, type: 'tabletStarted', v: 1, data: { app: 'test' } },
    { batch: benchWide, type: 'recipeTaken', v: 1, data: { hash: recipe, text: smallText } },
  ];
  const opened = { tag: 1, workOrder: 'WO', recipe, connectors: [{}, {}] };
  for (let made = 1; drafts.length < lineCount; made += 1) {
    const batch = `made-${made}`;
    drafts.push(
      { batch, type: 'batchOpened', v: 1, data: opened },
      { batch, type: 'stepFinished', v: 1, data: { step: 'strip', connectors: [1] } },
      { batch, type: 'stepFinished', v: 1, data: { step: 'strip', connectors: [2] } },
      { batch, type: 'scrapped', v: 1, data: { connectors: [1, 2], defect: 'crack' } },
      { batch, type: 'batchClosed', v: 1, data: { how: 'complete' } },
    );
  }
  const stamp = { ...place.clock.reading(), log: 'year', offset: 0, zone: 'UTC', by: 'MK', seen: null };
  const { lines, head } = makeLines(null, drafts, stamp);
  await memoryStore(place.memory).append(null, lines, head, [{ key: 'own', value: 'year' }]);
  return place;
}

/** A store that notes what is asked of it, and how many rows it gave. */
function counted(place: Place): { store: LogStore; asked: string[]; rows: () => number } {
  const store = memoryStore(place.memory);
  const asked: string[] = [];
  let rows = 0;
  const noted =
    <Args extends unknown[], Value>(name: string, run: (...args: Args) => Promise<Value>) =>
    async (...args: Args): Promise<Value> => {
      asked.push(args.length === 0 || typeof args[0] === 'object' ? name : `${name} ${args.join(' ')}`);
      const value = await run(...args);
      rows += Array.isArray(value) ? value.length : 0;
      return value;
    };
  return {
    store: {
      ...store,
      heads: noted('heads', store.heads),
      append: noted('append', store.append),
      linesOfBatch: noted('linesOfBatch', store.linesOfBatch),
      lines: noted('lines', store.lines),
      derived: noted('derived', store.derived),
      derivedBetween: noted('derivedBetween', store.derivedBetween),
      putDerived: noted('putDerived', store.putDerived),
      count: noted('count', store.count),
    },
    asked,
    rows: () => rows,
  };
}

describe('what a start costs', () => {
  let place: Place;
  beforeAll(async () => {
    place = await yearOfWork();
    await startOn(place);
  }, 60_000);

  it('reads nothing of closed batches, however many lines there are', async () => {
    expect(place.memory.lines.size).toBeGreaterThanOrEqual(lineCount);
    expect([...place.memory.derived.keys()].filter((key) => key.startsWith('summary:')).length).toBe(4000);
    const { store, asked, rows } = counted(place);
    const log = await restart(place, store);
    expect(asked.sort()).toEqual(['append', 'derived own', 'derived recipe:', 'derived wide', 'heads']);
    expect(rows()).toBe(4);
    expect(log.bench.batches).toEqual({});
  });

  it('reads the lines of open batches, and the register stays small', async () => {
    const log = await restart(place);
    for (const id of ['b1', 'b2', 'b3']) await openBatch(log, place, id, 3);
    await granted(log, place, { type: 'end batch short', batch: 'b2', defect: 'crack' });
    const { store, asked, rows } = counted(place);
    const again = await restart(place, store);
    expect(Object.keys(again.bench.batches).sort()).toEqual(['b1', 'b3']);
    expect(asked.filter((each) => each.startsWith('lines')).sort()).toEqual(['linesOfBatch b1', 'linesOfBatch b3']);
    expect(rows()).toBe(6);
    const register = place.memory.derived.get('wide') as { value: string };
    expect(register.value.length).toBeLessThan(3000);
  });

  it('a command on open work reads nothing', async () => {
    const { store, asked } = counted(place);
    const log = await restart(place, store);
    asked.length = 0;
    await granted(log, place, { type: 'finish step', batch: 'b1', step: 'strip', connectors: [1, 2] });
    expect(codeOf(await log.ask({ type: 'finish step', batch: 'b1', step: 'strip', connectors: [1] }))).toBe(
      'not at this step',
    );
    expect(asked).toEqual(['append']);
  });
});
