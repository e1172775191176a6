import { describe, expect, it } from 'vitest';
import { clocks } from '../../src/core/timer/clocks.ts';
import { doseNow } from '../../src/core/timer/cure-clock.ts';
import { readClock } from '../../src/core/timer/reading.ts';
import { codeOf, entriesIn, granted, keysIn, linesIn, newPlace, openBatch, restart, startOn } from './bench-kit.ts';

const from = (first: number, last: number): number[] =>
  Array.from({ length: last - first + 1 }, (_, index) => first + index);
const types = (place: Parameters<typeof entriesIn>[0]) => entriesIn(place).map(({ type }) => type);

async function filled(place = newPlace(), count = 2) {
  const log = await startOn(place);
  await openBatch(log, place, 'b1', count);
  const on = { batch: 'b1', connectors: from(1, count) };
  await granted(
    log,
    place,
    { type: 'finish step', step: 'strip', ...on },
    { type: 'mix adhesive', ...on, mix: 'm1', lot: 'A-1', roomC: 23 },
    { type: 'finish step', step: 'fill', ...on },
  );
  return { place, log };
}

describe('a page on new storage', () => {
  it('writes that the tablet started, before anything else', async () => {
    const place = newPlace();
    const log = await startOn(place);
    expect(entriesIn(place).map(({ type, seq, data }) => [type, seq, data])).toEqual([
      ['tabletStarted', 1, { app: 'test' }],
    ]);
    expect(log.head).toMatchObject({ seq: 1 });
    expect(log.bench.batches).toEqual({});
  });

  it('goes on with the same log after a restart, and with a new one on restored lines', async () => {
    const place = newPlace();
    const first = (await startOn(place)).head?.log;
    expect((await restart(place)).head).toMatchObject({ log: first, seq: 2 });
    place.memory.derived.delete('own');
    const restored = await restart(place);
    expect(restored.head).toMatchObject({ seq: 1 });
    expect(restored.head?.log).not.toBe(first);
    expect((await restart(place)).head).toMatchObject({ log: restored.head?.log, seq: 2 });
  });

  it('opens a new log where its own lost its head, and orders it after all that is there', async () => {
    const place = newPlace();
    const log = await startOn(place);
    await openBatch(log, place, 'b1', 1);
    place.memory.heads.set(log.head?.log ?? '', { torn: true });
    place.clock.setWall(place.clock.reading().wall - 3_600_000);
    const again = await restart(place);
    expect(again.head?.log).not.toBe(log.head?.log);
    await granted(again, place, { type: 'finish step', batch: 'b1', step: 'strip', connectors: [1] });
    expect(again.bench.batches['b1']?.connectors[0]?.stands).toEqual({ at: 'step', step: 1 });
    expect(entriesIn(place).at(-1)?.type).toBe('stepFinished');
    expect((await restart(place)).bench.batches['b1']).toEqual(again.bench.batches['b1']);
  });
});

describe('asking', () => {
  it('shows what was asked once it is saved, and tells who listens', async () => {
    const { place, log } = await filled();
    let told = 0;
    const stop = log.subscribe(() => (told += 1));
    await granted(log, place, {
      type: 'start load',
      batch: 'b1',
      step: 'cure',
      load: 'l1',
      station: '',
      connectors: [1, 2],
    });
    expect(told).toBe(1);
    expect(clocks(log.bench).map(({ id }) => id)).toEqual(['cure:l1:b1']);
    stop();
    await granted(log, place, { type: 'undo', batch: 'b1' });
    expect(told).toBe(1);
    expect(clocks(log.bench).map(({ kind }) => kind)).toEqual([]);
  });

  it('leaves no entry behind a refusal', async () => {
    const { place, log } = await filled();
    const before = linesIn(place);
    expect(codeOf(await log.ask({ type: 'pass', batch: 'b1', step: 'inspect', connectors: [1] }))).toBe(
      'not at this step',
    );
    expect(linesIn(place)).toEqual(before);
  });

  it('refuses a value that no entry can hold, and does not break', async () => {
    const place = newPlace();
    const log = await startOn(place);
    const shift = 'x'.repeat(200);
    await granted(log, place, { type: 'set bench', tablet: 'Bench', operators: ['MK'], shifts: [] });
    expect(codeOf(await log.ask({ type: 'sign on', operator: 'MK', shift }))).toBe('does not fit');
    expect(codeOf(await log.ask({ type: 'sign on', operator: 'MK', shift: 'early' }))).toBeNull();
  });

  it('writes nothing to a batch that is not there', async () => {
    const place = newPlace();
    const log = await startOn(place);
    const seen = await log.ask({ type: 'see clock', batch: 'b9', clock: 'cure:l1:b9', lateS: 3 });
    expect(codeOf(seen)).toBe('batch unknown');
    expect(log.misfits).toEqual([]);
  });

  it('takes what is asked at once one after the other', async () => {
    const place = newPlace();
    const log = await startOn(place);
    await openBatch(log, place, 'b1', 3);
    const answers = await Promise.all(
      [1, 2, 1].map((number) => log.ask({ type: 'finish step', batch: 'b1', step: 'strip', connectors: [number] })),
    );
    expect(answers.map(codeOf)).toEqual([null, null, 'not at this step']);
    expect(linesIn(place).map(({ seq }) => seq)).toEqual(from(1, linesIn(place).length));
  });

  it('takes a mix back with the step that took it, also after a restart, but not under a closed batch', async () => {
    const place = newPlace();
    const log = await startOn(place);
    await openBatch(log, place, 'b1', 1);
    await openBatch(log, place, 'b2', 1);
    const strip = (batch: string) => ({ type: 'finish step', batch, step: 'strip', connectors: [1] }) as const;
    const mix = { type: 'mix adhesive', batch: 'b1', connectors: [1], lot: 'A', roomC: null } as const;
    await granted(log, place, strip('b1'), strip('b2'), { ...mix, mix: 'm1' });
    const second = await restart(place);
    await granted(second, place, { type: 'undo', batch: 'b1' });
    expect(second.bench.wide.mixes).toEqual({});
    await granted(
      second,
      place,
      { ...mix, mix: 'm2' },
      { type: 'use mix', batch: 'b2', connectors: [1], mix: 'm2' },
      { type: 'end batch short', batch: 'b2', defect: 'crack' },
    );
    const third = await restart(place);
    expect(Object.keys(third.bench.batches)).toEqual(['b1']);
    await granted(third, place, { type: 'undo', batch: 'b1' });
    expect(Object.keys(third.bench.wide.mixes)).toEqual(['m2']);
  });
});

describe('times', () => {
  it('counts a late entry from when it happened, across a restart', async () => {
    const { place, log } = await filled();
    log.close();
    place.clock.sleep(1_500_000);
    const again = await restart(place);
    await granted(again, place, {
      type: 'start load',
      batch: 'b1',
      step: 'cure',
      load: 'l1',
      station: '',
      connectors: [1, 2],
      late: { agoS: 1300, reason: 'tablet was off' },
    });
    const [cure] = clocks(again.bench);
    expect(cure && readClock(cure, again.now)).toMatchObject({ state: 'done', leftMs: -100_000 });
    const tooEarly = await again.ask({
      type: 'end load',
      batch: 'b1',
      load: 'l1',
      nextLoad: 'c1',
      late: { agoS: 1400, reason: 'tablet was off' },
    });
    expect(codeOf(tooEarly)).toBe('earlier than what it follows');
    await granted(again, place, { type: 'end load', batch: 'b1', load: 'l1', nextLoad: 'c1' });
    expect(again.bench.batches['b1']?.loads[0]?.ended?.verdict).toBe('in time');
    expect((await restart(place)).bench.batches).toEqual(again.bench.batches);
  });

  it('puts a late oven reading where it happened, before one that was entered earlier', async () => {
    const { place, log } = await filled();
    await granted(
      log,
      place,
      { type: 'set oven', oven: 'o1', name: 'Oven 1', setPointC: 100, warmUpS: null },
      { type: 'start load', batch: 'b1', step: 'cure', load: 'l1', station: 'o1', connectors: [1, 2] },
    );
    await place.clock.pass(600_000);
    await granted(log, place, { type: 'read oven', oven: 'o1', temperatureC: 100 });
    const before = doseNow(log.bench, clocks(log.bench)[0]!, log.now)?.dose;
    const late = { agoS: 300, reason: 'read off the chart' };
    await granted(log, place, { type: 'read oven', oven: 'o1', temperatureC: 70, late });
    const read = (bench: typeof log.bench) =>
      bench.wide.ovens['o1']?.history.map((one) => (one.kind === 'read' ? one.temperatureC : one.kind));
    expect(read(log.bench)).toEqual(['set', 70, 100]);
    const after = doseNow(log.bench, clocks(log.bench)[0]!, log.now)?.dose;
    expect(after).toBeLessThan(before ?? 0);
    const again = await restart(place);
    expect(read(again.bench)).toEqual(['set', 70, 100]);
    expect(clocks(again.bench)).toEqual(clocks(log.bench));
  });

  it('asks how long the tablet was off when the wall clock stands behind, and counts nothing until then', async () => {
    const { place, log } = await filled();
    await granted(log, place, {
      type: 'start load',
      batch: 'b1',
      step: 'cure',
      load: 'l1',
      station: '',
      connectors: [1, 2],
    });
    const since = log.now;
    place.clock.setWall(since.wall - 3_600_000);
    const again = await restart(place);
    expect(again.bench.wide.unknownGap).toEqual({ since });
    expect(again.now.bench).toBe(since.bench);
    expect(clocks(again.bench).map(({ uncertain }) => uncertain)).toEqual([true]);
    const third = await restart(place);
    expect(third.bench.wide.unknownGap).toEqual({ since });
    await granted(third, place, { type: 'state time', addedS: 1800 });
    expect(third.bench.wide.unknownGap).toBeNull();
    const [cure] = clocks(third.bench);
    expect(cure && readClock(cure, third.now)).toMatchObject({ state: 'done', leftMs: -600_001 });
    expect((await restart(place)).bench.wide.unknownGap).toBeNull();
  });

  it('has a sleep on record before the command that was asked after it', async () => {
    const { place, log } = await filled();
    place.clock.sleep(900_000);
    const woke = log.write([{ batch: 'bench', type: 'tabletWoke', v: 1, data: {} }]);
    const asked = log.ask({
      type: 'start load',
      batch: 'b1',
      step: 'cure',
      load: 'l1',
      station: '',
      connectors: [1, 2],
    });
    expect([codeOf(await woke), codeOf(await asked)]).toEqual([null, null]);
    expect(types(place).slice(-2)).toEqual(['tabletWoke', 'loadStarted']);
    const [last, before] = [entriesIn(place).at(-1), entriesIn(place).at(-3)];
    expect((last?.bench ?? 0) - (before?.bench ?? 0)).toBe(900_000);
  });
});

describe('closing', () => {
  const short = (batch: string) => ({ type: 'end batch short', batch, defect: 'crack' }) as const;

  it('leaves one summary row, none once reopened, and one again, across restarts', async () => {
    const { place, log } = await filled();
    await granted(log, place, short('b1'));
    expect(keysIn(place, 'summary:')).toHaveLength(1);
    const second = await restart(place);
    expect(second.bench.batches).toEqual({});
    await granted(second, place, { type: 'reopen batch', batch: 'b1' });
    expect(keysIn(place, 'summary:')).toEqual([]);
    expect(second.bench.batches['b1']?.closed).toBeNull();
    const third = await restart(place);
    expect(Object.keys(third.bench.batches)).toEqual(['b1']);
    await place.clock.pass(5000);
    await granted(third, place, short('b1'));
    expect(keysIn(place, 'summary:')).toHaveLength(1);
    expect(await third.summaryRows(0)).toHaveLength(1);
  });

  it('is not undone while another batch wears the tag; reopening finds a free one', async () => {
    const { place, log } = await filled();
    await granted(log, place, short('b1'));
    await openBatch(log, place, 'b2', 1);
    expect(codeOf(await log.ask({ type: 'undo', batch: 'b1' }))).toBe('tag taken');
    await granted(log, place, { type: 'reopen batch', batch: 'b1' });
    expect(Object.values(log.bench.batches).map(({ tag }) => tag)).toEqual([2, 1]);
  });

  it('gives a reopened batch its working life back, however long it was closed', async () => {
    const place = newPlace();
    const log = await startOn(place);
    await openBatch(log, place, 'b1', 1);
    await granted(
      log,
      place,
      { type: 'finish step', batch: 'b1', step: 'strip', connectors: [1] },
      { type: 'mix adhesive', batch: 'b1', connectors: [1], mix: 'm1', lot: 'A-1', roomC: 23 },
      short('b1'),
    );
    place.clock.sleep(3 * 86_400_000);
    // The register forgets the mix with the first entry a day later.
    await granted(await restart(place), place, { type: 'set bench', tablet: 'B', operators: [], shifts: [] });
    const again = await restart(place);
    expect(again.bench.wide.mixes).toEqual({});
    await granted(again, place, { type: 'reopen batch', batch: 'b1' });
    const fill = { type: 'finish step', batch: 'b1', step: 'fill', connectors: [1] } as const;
    expect(codeOf(await again.ask(fill))).toBe('working life over');
    expect(codeOf(await (await restart(place)).ask(fill))).toBe('working life over');
  });

  it('shows a closed batch when it is asked for, with its mixes', async () => {
    const { place, log } = await filled();
    await granted(log, place, short('b1'));
    const again = await restart(place);
    expect(await again.fetchBatch('b1')).toEqual(log.bench.batches['b1']);
    expect(await again.fetchBatch('never')).toBeNull();
    expect(again.bench.wide.mixes['m1']?.lot).toBe('A-1');
  });

  it('makes a damaged or older summary row anew, in its place', async () => {
    const { place, log } = await filled();
    await granted(log, place, short('b1'));
    const [key = ''] = keysIn(place, 'summary:');
    const sound = await log.summaryRows(0);
    for (const value of ['torn', '{"version":0}']) {
      place.memory.derived.set(key, { key, value });
      expect(await log.summaryRows(0)).toEqual(sound);
      expect(keysIn(place, 'summary:')).toEqual([key]);
      expect(place.memory.derived.get(key)).toEqual({ key, value: JSON.stringify(sound[0]) });
    }
  });
});
