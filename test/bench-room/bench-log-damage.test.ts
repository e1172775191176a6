import { describe, expect, it } from 'vitest';
import { readRegister } from '../../src/bench/register-row.ts';
import type { Head } from '../../src/core/event/entry.ts';
import { sha256 } from '../../src/core/event/hash.ts';
import { clocks } from '../../src/core/timer/clocks.ts';
import { memoryKey } from '../../src/log/memory-store.ts';
import {
  codeOf,
  granted,
  keysIn,
  linesIn,
  newPlace,
  openBatch,
  openIn,
  restart,
  startOn,
  wholeBench,
  type Place,
} from './bench-kit.ts';

/** Two open batches, one of them in an oven, and one closed. */
async function shop(): Promise<Place> {
  const place = newPlace();
  const log = await startOn(place);
  for (const id of ['b1', 'b2', 'b3']) await openBatch(log, place, id, 2);
  const on = { batch: 'b1', connectors: [1, 2] };
  await granted(
    log,
    place,
    { type: 'set oven', oven: 'o1', name: 'Oven 1', setPointC: 100, warmUpS: 600 },
    { type: 'finish step', step: 'strip', ...on },
    { type: 'mix adhesive', ...on, mix: 'm1', lot: 'A-1', roomC: 23 },
    { type: 'finish step', step: 'fill', ...on },
    { type: 'start load', step: 'cure', load: 'l1', station: 'o1', ...on },
    { type: 'read oven', oven: 'o1', temperatureC: 60 },
    { type: 'end batch short', batch: 'b3', defect: 'crack' },
  );
  log.close();
  return place;
}

const storedRow = (place: Place, key: string): string =>
  (place.memory.derived.get(key) as { value: string } | undefined)?.value ?? '';
const store = (place: Place, key: string, value: unknown) => place.memory.derived.set(key, { key, value });

async function expectWhole(place: Place): Promise<void> {
  const whole = wholeBench(place);
  const log = await restart(place);
  expect(openIn(log.bench)).toEqual(openIn(whole));
  expect(clocks(log.bench)).toEqual(clocks(whole));
  expect(log.bench.wide.ovens).toEqual(whole.wide.ovens);
  expect(log.bench.wide.mixes).toEqual(whole.wide.mixes);
  expect(Object.keys(log.bench.wide.recipes)).toEqual(Object.keys(whole.wide.recipes));
  expect(log.unreadable).toEqual([]);
  expect(keysIn(place, 'summary:')).toHaveLength(1);
  // What was made anew is kept: the next start has it.
  expect(readRegister(storedRow(place, 'wide'), [...place.memory.heads.values()] as Head[])).not.toBeNull();
  expect(openIn((await restart(place)).bench)).toEqual(openIn(whole));
}

const resealed = (place: Place, change: (row: Record<string, unknown>) => void): string => {
  const row = JSON.parse(storedRow(place, 'wide').slice(65)) as Record<string, unknown>;
  change(row);
  const text = JSON.stringify(row);
  return `${sha256(text)} ${text}`;
};

describe('a register that cannot be used is made anew', () => {
  const damages: Record<string, (place: Place) => unknown> = {
    'that is missing': (place) => place.memory.derived.delete('wide'),
    'that is no text': (place) => store(place, 'wide', { not: 'text' }),
    'that is cut off': (place) => store(place, 'wide', storedRow(place, 'wide').slice(0, -20)),
    'that is empty': (place) => store(place, 'wide', ''),
    'with another letter': (place) => store(place, 'wide', storedRow(place, 'wide').replace('Oven 1', 'Oven 7')),
    'that knows of no log': (place) =>
      store(
        place,
        'wide',
        resealed(place, (row) => (row.heads = {})),
      ),
    'of an older fold': (place) =>
      store(
        place,
        'wide',
        resealed(place, (row) => (row.fold = 0)),
      ),
    'that names a log which is not here': (place) =>
      store(
        place,
        'wide',
        resealed(place, (row) => (row.heads = { ...(row.heads as object), elsewhere: 'x' })),
      ),
  };
  it.each(Object.keys(damages))('%s', async (name) => {
    const place = await shop();
    damages[name]?.(place);
    await expectWhole(place);
  });

  it('that stands behind the heads', async () => {
    const place = await shop();
    const stale = storedRow(place, 'wide');
    const log = await restart(place);
    await granted(log, place, { type: 'finish step', batch: 'b2', step: 'strip', connectors: [1] });
    store(place, 'wide', stale);
    await expectWhole(place);
  });

  it('with all other derived rows, when every one is lost', async () => {
    const place = await shop();
    place.memory.derived.clear();
    await expectWhole(place);
  });

  it('and rows that stand for no closed batch go', async () => {
    const place = await shop();
    const [key = ''] = keysIn(place, 'summary:');
    const value = storedRow(place, key);
    store(place, key.replace('b3', 'b1'), value);
    store(place, key.replace(/\d{13}/, '0000000000001'), value);
    place.memory.derived.delete('wide');
    await expectWhole(place);
    expect(keysIn(place, 'summary:')).toEqual([key]);
  });
});

describe('a recipe row that cannot be used is made anew', () => {
  it.each([
    ['missing', null],
    ['cut off', '{"format":'],
    ['another text', '{}'],
  ])('%s', async (_, value) => {
    const place = await shop();
    const [key = ''] = keysIn(place, 'recipe:');
    const sound = storedRow(place, key);
    if (value === null) place.memory.derived.delete(key);
    else store(place, key, value);
    await expectWhole(place);
    expect(storedRow(place, key)).toBe(sound);
  });
});

describe('a line that cannot be read', () => {
  const lineOf = (place: Place, type: string) => linesIn(place).find(({ text }) => text.includes(`"type":"${type}"`));
  function change(place: Place, type: string, to: (text: string) => string): string {
    const line = lineOf(place, type);
    if (!line) throw new Error(type);
    const text = to(line.text);
    place.memory.lines.set(memoryKey(line), { ...line, text });
    return text;
  }
  const newer = (text: string) => text.replace('"v":1', '"v":9');
  const torn = (text: string) => text.slice(0, 100);

  it.each([
    ['of a later version', newer, 'unknown'],
    ['that is damaged', torn, 'damaged'],
  ])('%s in the middle of an open batch is shown, and the others fold', async (_, to, kind) => {
    const place = await shop();
    const text = change(place, 'stepFinished', to);
    for (let start = 1; start <= 3; start += 1) {
      const log = await restart(place);
      expect(log.unreadable.map((each) => [each.batch, each.text, each.problem.kind])).toEqual([['b1', text, kind]]);
      expect(openIn(log.bench)).toEqual(openIn(wholeBench(place)));
      expect(Object.keys(openIn(log.bench)).sort()).toEqual(['b1', 'b2']);
      expect(log.misfits.length).toBeGreaterThan(0);
    }
  });

  it('of the bench is shown at every start, and goes when a later version can read it', async () => {
    const place = await shop();
    const sound = lineOf(place, 'ovenRead')?.text ?? '';
    const text = change(place, 'ovenRead', newer);
    place.memory.derived.delete('wide');
    for (let start = 1; start <= 3; start += 1) {
      const log = await restart(place);
      expect(log.unreadable.map((each) => [each.batch, each.text])).toEqual([['bench', text]]);
      expect(log.bench.wide.ovens['o1']?.history.map(({ kind }) => kind)).toEqual(['set']);
    }
    const line = linesIn(place).find((each) => each.text === text);
    if (line) place.memory.lines.set(memoryKey(line), { ...line, text: sound });
    const log = await restart(place);
    expect(log.unreadable).toEqual([]);
    expect(log.bench.wide.ovens['o1']?.history.map(({ kind }) => kind)).toEqual(['set', 'read']);
  });

  it('of a batch that closes is shown after it closed', async () => {
    const place = await shop();
    const text = change(place, 'stepFinished', torn);
    await granted(await restart(place), place, { type: 'end batch short', batch: 'b1', defect: 'crack' });
    const log = await restart(place);
    expect(Object.keys(log.bench.batches)).toEqual(['b2']);
    expect(log.unreadable.map((each) => each.text)).toEqual([text]);
  });

  it('that opened a batch leaves the rest of it as entries that do not fit', async () => {
    const place = await shop();
    const text = change(place, 'batchOpened', torn);
    const log = await restart(place);
    expect(log.unreadable.map((each) => each.text)).toEqual([text]);
    expect(Object.keys(openIn(log.bench))).toEqual(['b2']);
    expect(log.bench.wide.misfits.map(({ why }) => why)).toContain('batch not opened');
    const again = await restart(place);
    expect(again.unreadable.map((each) => each.text)).toEqual([text]);
    expect(again.bench.wide.misfits).toEqual(log.bench.wide.misfits);
  });

  it('whose row lost its text and its batch is still counted', async () => {
    const place = await shop();
    const line = lineOf(place, 'ovenRead');
    if (line) place.memory.lines.set(memoryKey(line), { log: line.log, seq: line.seq });
    place.memory.derived.delete('wide');
    expect((await restart(place)).unreadable).toHaveLength(1);
    expect((await restart(place)).unreadable).toHaveLength(1);
  });

  it('does not keep the batch from being worked on', async () => {
    const place = await shop();
    change(place, 'ovenRead', newer);
    place.memory.derived.delete('wide');
    const log = await restart(place);
    const answer = await log.ask({ type: 'finish step', batch: 'b2', step: 'strip', connectors: [1] });
    expect(codeOf(answer)).toBeNull();
  });
});
