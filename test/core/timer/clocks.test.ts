import { describe, expect, test } from 'vitest';
import { clockId } from '../../../src/core/timer/clock.ts';
import { clocks } from '../../../src/core/timer/clocks.ts';
import { doseNow } from '../../../src/core/timer/cure-clock.ts';
import { elapsedMs } from '../../../src/core/unit/moment.ts';
import { from, Script } from '../../fake/script.ts';

const dueS = (script: Script, id: string) => {
  const clock = clocks(script.bench).find((one) => one.id === id);
  if (!clock)
    throw new Error(
      `no clock ${id} among ${clocks(script.bench)
        .map((one) => one.id)
        .join(', ')}`,
    );
  return clock.due === null ? null : Math.round(elapsedMs(clock.from, clock.due) / 1000);
};
const ids = (script: Script) => clocks(script.bench).map(({ id }) => id);

const mixed = (script: Script, batch: string, connectors: readonly number[], mix = `mix-${batch}`) =>
  script
    .do({ type: 'finish step', batch, step: 'strip', connectors })
    .do({ type: 'mix adhesive', batch, mix, lot: 'L-7', roomC: 22, connectors });

const oven = (script: Script, setPointC = 100, id = 'oven-1') =>
  script.do({ type: 'set oven', oven: id, name: 'Oven 1', setPointC, warmUpS: null });

const curing = (script: Script, batch: string, load: string, connectors: readonly number[], station = 'oven-1') =>
  script
    .do({ type: 'finish step', batch, step: 'fill', connectors })
    .do({ type: 'start load', batch, step: 'cure', load, station, connectors });

describe('a working life', () => {
  test('runs from the mix until the limited step is finished for every connector that carries it', () => {
    const script = mixed(new Script().open('b1', 4), 'b1', from(1, 4));
    expect(ids(script)).toEqual(['life:mix-b1:b1']);
    expect(clocks(script.bench)[0]).toMatchObject({
      kind: 'at most',
      tag: 1,
      step: 1,
      about: { type: 'working life', mix: 'mix-b1', lot: 'L-7', connectors: 4, limitStep: 2 },
    });
    expect(dueS(script, 'life:mix-b1:b1')).toBe(3600);
    script.do({ type: 'finish step', batch: 'b1', step: 'fill', connectors: [1, 2, 3] });
    expect(clocks(script.bench)[0]?.about).toMatchObject({ connectors: 1 });
    script.do({ type: 'finish step', batch: 'b1', step: 'fill', connectors: [4] });
    expect(ids(script)).toEqual([]);
  });

  test('a second mix in the middle of a batch has its own clock', () => {
    const script = mixed(new Script().open('b1', 4), 'b1', from(1, 4)).wait(600);
    script.do({ type: 'mix adhesive', batch: 'b1', mix: 'second', lot: 'L-8', roomC: null, connectors: [3, 4] });
    expect(clocks(script.bench).map(({ about }) => about)).toMatchObject([
      { mix: 'mix-b1', connectors: 2 },
      { mix: 'second', connectors: 2 },
    ]);
  });

  test('one mix in two batches limits each', () => {
    const script = mixed(new Script().open('b1', 2).open('b2', 2), 'b1', from(1, 2), 'shared');
    script.do({ type: 'finish step', batch: 'b2', step: 'strip', connectors: [1, 2] });
    script.do({ type: 'use mix', batch: 'b2', mix: 'shared', connectors: [1, 2] });
    expect(ids(script)).toEqual(['life:shared:b1', 'life:shared:b2']);
  });

  test('of a scrapped connector limits nothing', () => {
    const script = mixed(new Script().open('b1', 1), 'b1', [1]);
    script.do({ type: 'scrap', batch: 'b1', defect: 'crack', connectors: [1] });
    expect(ids(script)).toEqual([]);
  });
});

describe('a load', () => {
  test('cures for the maker’s time in its own oven', () => {
    const script = oven(oven(mixed(new Script().open('b1', 4), 'b1', from(1, 4))), 120, 'oven-2');
    curing(script, 'b1', 'l1', [1, 2]);
    curing(script, 'b1', 'l2', [3, 4], 'oven-2');
    expect(dueS(script, 'cure:l1:b1')).toBe(1200);
    expect(dueS(script, 'cure:l2:b1')).toBe(450);
  });

  test('of two batches in one oven has a clock for each', () => {
    const script = oven(mixed(mixed(new Script().open('b1', 2).open('b2', 2), 'b1', [1, 2]), 'b2', [1, 2]));
    curing(script, 'b1', 'tray', [1, 2]);
    curing(script, 'b2', 'tray', [1, 2]);
    expect(ids(script)).toEqual(['cure:tray:b1', 'cure:tray:b2']);
  });

  test('in an oven of which nothing is known is assumed to be at the recipe’s set point', () => {
    const script = curing(mixed(new Script().open('b1', 1), 'b1', [1]), 'b1', 'l1', [1], '');
    expect(clocks(script.bench)[0]?.about).toMatchObject({ why: { kind: 'assumed set point', temperatureC: 100 } });
  });

  test('started late is due so much earlier', () => {
    const script = oven(mixed(new Script().open('b1', 1), 'b1', [1])).wait(1200);
    script.do({ type: 'finish step', batch: 'b1', step: 'fill', connectors: [1], late: { agoS: 900, reason: 'busy' } });
    script.do({
      type: 'start load',
      batch: 'b1',
      step: 'cure',
      load: 'l1',
      station: 'oven-1',
      connectors: [1],
      late: { agoS: 600, reason: 'busy' },
    });
    const [clock] = clocks(script.bench);
    if (!clock?.due) throw new Error('no due moment');
    expect(Math.round(elapsedMs(script.now, clock.due) / 1000)).toBe(600);
  });

  test('follows what is entered of its oven, and says why', () => {
    const script = oven(mixed(new Script().open('b1', 1), 'b1', [1]));
    curing(script, 'b1', 'l1', [1]).wait(600);
    script.do({ type: 'disturb oven', oven: 'oven-1', what: 'door opened' }).wait(240);
    expect(dueS(script, 'cure:l1:b1')).toBeNull();
    script.do({ type: 'read oven', oven: 'oven-1', temperatureC: 100 });
    expect(dueS(script, 'cure:l1:b1')).toBe(1440);
    const [clock] = clocks(script.bench);
    if (!clock) throw new Error('no clock');
    expect(clock.about).toMatchObject({ why: { kind: 'oven read', temperatureC: 100 } });
    const now = doseNow(script.bench, clock, script.now);
    expect(now).toMatchObject({ temperatureC: 100, coldestC: 23, why: { kind: 'oven read' } });
    expect(now?.dose).toBeCloseTo(0.5, 4);
  });

  test('cools down at least so long, then is polished for an aim', () => {
    const script = oven(mixed(new Script().open('b1', 1), 'b1', [1]));
    curing(script, 'b1', 'l1', [1]).wait(1300);
    script.do({ type: 'end load', batch: 'b1', load: 'l1', nextLoad: 'c1' });
    expect(clocks(script.bench)).toMatchObject([
      { id: 'wait:c1:b1', kind: 'at least', about: { type: 'wait' }, over: null },
    ]);
    expect(dueS(script, 'wait:c1:b1')).toBe(600);
    script.wait(700).do({ type: 'end load', batch: 'b1', load: 'c1', nextLoad: 'n1' });
    script.do({ type: 'start load', batch: 'b1', step: 'film-1', load: 'p1', station: 'machine', connectors: [1] });
    const [polish] = clocks(script.bench);
    expect(polish).toMatchObject({ id: 'polish:p1:b1', kind: 'aim', about: { type: 'polish', filmUm: 1 } });
    if (!polish?.due || !polish.earliest || !polish.over) throw new Error('moments missing');
    expect(elapsedMs(polish.earliest, polish.due)).toBe(5000);
    expect(elapsedMs(polish.due, polish.over)).toBe(5000);
  });

  test('runs on while its batch is held, and no longer once it is ended', () => {
    const script = oven(mixed(new Script().open('b1', 1), 'b1', [1]));
    curing(script, 'b1', 'l1', [1]).do({ type: 'hold batch', batch: 'b1', reason: 'lead asked' });
    expect(ids(script)).toEqual(['cure:l1:b1']);
    script.wait(1300).do({ type: 'end load', batch: 'b1', load: 'l1', nextLoad: 'c1' });
    expect(ids(script)).toEqual([]);
  });

  test('of a batch that was ended short has no clock', () => {
    const script = oven(mixed(new Script().open('b1', 2), 'b1', [1, 2]));
    curing(script, 'b1', 'l1', [1]).do({ type: 'end batch short', batch: 'b1', defect: 'crack' });
    expect(ids(script)).toEqual([]);
    // Even where its load was never ended.
    const { bench } = script;
    const running = script.batch('b1').loads.map((load) => ({ ...load, ended: null }));
    expect(clocks({ ...bench, batches: { b1: { ...script.batch('b1'), loads: running } } })).toEqual([]);
  });

  test('is marked uncertain where another tablet read its oven', () => {
    const script = oven(mixed(new Script().open('b1', 1), 'b1', [1]));
    curing(script, 'b1', 'l1', [1]).wait(60);
    expect(clocks(script.bench)[0]?.uncertain).toBe(false);
    const other = new Script({ log: 'log-b', wall: script.wall });
    oven(other).do({ type: 'read oven', oven: 'oven-1', temperatureC: 95 });
    const { wide } = script.bench;
    const read = other.bench.wide.ovens['oven-1']?.history.filter(({ kind }) => kind === 'read') ?? [];
    const mine = wide.ovens['oven-1'];
    if (!mine) throw new Error('no oven');
    const both = { ...mine, history: [...mine.history, ...read] };
    const bench = { ...script.bench, wide: { ...wide, ovens: { 'oven-1': both } } };
    expect(clocks(bench)[0]).toMatchObject({
      uncertain: true,
      about: { why: { kind: 'oven read', temperatureC: 95 } },
    });
  });

  test('has been seen when somebody said so', () => {
    const script = oven(mixed(new Script().open('b1', 1), 'b1', [1]));
    curing(script, 'b1', 'l1', [1]).wait(1210);
    script.do({ type: 'see clock', batch: 'b1', clock: 'cure:l1:b1', lateS: 10 });
    expect(clocks(script.bench)[0]).toMatchObject({ seen: true });
  });
});

describe('a gap of unknown length', () => {
  /** A page that starts with its wall clock an hour behind the last line. */
  const restartedBehind = (script: Script) => {
    const since = script.bench.wide.lastEntry[script.log];
    script.wall -= 3_600_000;
    script.write([{ batch: 'bench', type: 'tabletStarted', v: 1, data: { app: 'test' } }]);
    return since;
  };

  test('ends a working life until it is stated, and takes nothing from a cure', () => {
    const script = oven(mixed(new Script().open('b1', 3), 'b1', from(1, 3)));
    curing(script, 'b1', 'l1', [1]).wait(60);
    const since = restartedBehind(script);
    expect(clocks(script.bench).map(({ id, uncertain }) => [id, uncertain])).toEqual([
      ['cure:l1:b1', true],
      ['life:mix-b1:b1', true],
    ]);
    expect(clocks(script.bench)[1]).toMatchObject({ due: since, over: since });
    expect(dueS(script, 'cure:l1:b1')).toBe(1200);
    script.do({ type: 'state time', addedS: 300 });
    expect(dueS(script, 'life:mix-b1:b1')).toBe(3600);
    expect(clocks(script.bench).every(({ uncertain }) => !uncertain)).toBe(true);
  });

  test('leaves a clock alone that began after it', () => {
    const script = new Script().open('b1', 1);
    restartedBehind(script);
    mixed(script, 'b1', [1]);
    expect(dueS(script, 'life:mix-b1:b1')).toBe(3600);
    expect(clocks(script.bench)[0]?.uncertain).toBe(false);
  });
});

describe('the id of a clock', () => {
  test('names what it is about', () => {
    expect(clockId('cure', 'l1', 'b1')).toBe('cure:l1:b1');
  });

  test('is never longer than an entry can name, and still tells clocks apart', () => {
    const long = 'x'.repeat(64);
    const made = [clockId('cure', long, 'b1'), clockId('cure', long, 'b2'), clockId('life', long, 'b1')];
    expect(made.every((id) => id.length <= 64)).toBe(true);
    expect(new Set(made).size).toBe(3);
  });
});
