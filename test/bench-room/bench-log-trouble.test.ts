import { describe, expect, it } from 'vitest';
import type { Answer } from '../../src/bench/bench-log.ts';
import { verify } from '../../src/core/event/chain.ts';
import type { Command } from '../../src/core/command/commands.ts';
import { StoreError } from '../../src/log/errors.ts';
import { memoryStore } from '../../src/log/memory-store.ts';
import { patienceMs, steadyStore } from '../../src/log/steady-store.ts';
import type { LogStore } from '../../src/log/store.ts';
import { fakeClock, settled } from '../fake/clock.ts';
import { faultyOpener, type Fault } from '../fake/faulty-store.ts';
import {
  codeOf,
  entriesIn,
  granted,
  linesIn,
  newPlace,
  openBatch,
  openIn,
  startOn,
  wholeBench,
  type Place,
} from './bench-kit.ts';

const strip = (...connectors: number[]): Command => ({ type: 'finish step', batch: 'b1', step: 'strip', connectors });
const typesIn = (place: Place) => entriesIn(place).map(({ type }) => type);
const states = (place: Place) => [...verify(linesIn(place)).values()].map(({ state }) => state);
const count = (place: Place, type: string) => typesIn(place).filter((each) => each === type).length;

describe('two windows on one log', () => {
  async function twoWindows() {
    const place = newPlace();
    const first = await startOn(place);
    await openBatch(first, place, 'b1', 3);
    const clock = fakeClock(place.clock.reading().wall);
    await clock.pass(1);
    const second = await startOn(place, memoryStore(place.memory), {
      ...clock,
      reading: () => ({ ...clock.reading(), page: 'other' }),
    });
    return { place, first, second };
  }

  it('the later one folds the news and decides again', async () => {
    const { place, first, second } = await twoWindows();
    await granted(second, place, strip(1));
    expect(codeOf(await first.ask(strip(1)))).toBe('not at this step');
    await granted(first, place, strip(2));
    await granted(second, place, strip(3));
    expect(openIn(second.bench)).toEqual(openIn(wholeBench(place)));
    expect(states(place)).toEqual(['unbroken']);
    expect(linesIn(place).map(({ seq }) => seq)).toEqual(linesIn(place).map((_, index) => index + 1));
  });

  it('both at once: none is lost, none forks the log', async () => {
    const { place, first, second } = await twoWindows();
    const answers = await Promise.all([first.ask(strip(1)), second.ask(strip(2)), first.ask(strip(3))]);
    expect(answers.map(codeOf)).toEqual([null, null, null]);
    expect(states(place)).toEqual(['unbroken']);
    expect(openIn(wholeBench(place))['b1']?.connectors.map(({ stands }) => 'step' in stands && stands.step)).toEqual([
      1, 1, 1,
    ]);
  });

  it('what the tablet noticed is written behind the news', async () => {
    const { place, first, second } = await twoWindows();
    await granted(second, place, strip(1));
    expect(codeOf(await first.write([{ batch: 'bench', type: 'tabletWoke', v: 1, data: {} }]))).toBeNull();
    expect(typesIn(place).slice(-2)).toEqual(['stepFinished', 'tabletWoke']);
    expect(first.bench.batches['b1']?.connectors[0]?.stands).toEqual({ at: 'step', step: 1 });
  });

  it('a batch that was in view stays in view', async () => {
    const { place, first, second } = await twoWindows();
    await granted(second, place, { type: 'end batch short', batch: 'b1', defect: 'crack' });
    expect(codeOf(await first.ask(strip(1)))).toBe('batch is closed');
    expect(first.bench.batches['b1']?.closed?.how).toBe('short');
  });

  it('a window that keeps writing in between is told, and nothing is written', async () => {
    const { place, first, second } = await twoWindows();
    let pushes = 0;
    const store = memoryStore(place.memory);
    const pushing = {
      ...store,
      append: async (...asked: Parameters<typeof store.append>) => {
        pushes += 1;
        await place.clock.pass(1);
        await second.ask({ type: 'set bench', tablet: `Bench ${pushes}`, operators: [], shifts: [] });
        return store.append(...asked);
      },
    };
    const third = await startOn(place, pushing, {
      ...place.clock,
      reading: () => ({ ...place.clock.reading(), page: 'third' }),
    });
    expect(codeOf(await third.ask(strip(1)))).toBe('not saved');
    expect(count(place, 'stepFinished')).toBe(0);
    expect(states(place)).toEqual(['unbroken']);
    expect(codeOf(await first.ask(strip(1)))).toBeNull();
  });
});

describe('a store that fails', () => {
  const lost: Fault = { what: 'lost', name: 'InvalidStateError' };
  const unheard: Fault = { what: 'unheard', name: 'InvalidStateError' };
  const silent: Fault = { what: 'unheard, silent' };

  /** A place whose store fails as planned, from when it is planned. */
  function failingPlace() {
    const place = newPlace();
    const sound = () => Promise.resolve(memoryStore(place.memory));
    let current: LogStore = memoryStore(place.memory);
    const shown = new Proxy({} as LogStore, {
      get: (_, key) => (key === 'close' ? () => {} : (Reflect.get(current, key) as unknown)),
    });
    const store = steadyStore(() => Promise.resolve(shown), { after: place.clock.after });
    const plan = async (...faults: (Fault | null)[]) => {
      current = await faultyOpener(sound, faults).open(() => {});
    };
    const replace = (other: LogStore) => (current = other);
    return { place, store, plan, replace };
  }

  async function failing() {
    const made = failingPlace();
    const log = await startOn(made.place, made.store);
    await openBatch(log, made.place, 'b1', 3);
    return { ...made, log };
  }

  /** Asks, and lets a store that does not answer use up all patience. */
  async function asked(place: Place, answer: Promise<Answer>): Promise<Answer> {
    await settled();
    for (let times = 0; times < 4; times += 1) await place.clock.pass(patienceMs.write);
    return answer;
  }

  it('once is tried again and saved', async () => {
    for (const fault of [lost, unheard, silent]) {
      const { place, log, plan } = await failing();
      await plan(fault);
      expect(codeOf(await asked(place, log.ask(strip(1))))).toBeNull();
      expect(count(place, 'stepFinished')).toBe(1);
    }
  });

  it.each([
    ['twice', lost, 0],
    ['twice, the write having come through', unheard, 1],
    ['twice without an answer, the write having come through', silent, 1],
  ])('%s: not saved, with the lines; asked again it is saved once', async (_, fault, written) => {
    const { place, log, plan } = await failing();
    const before = log.bench;
    await plan(fault, fault);
    const answer = await asked(place, log.ask(strip(1)));
    expect(answer.ok).toBe(false);
    if (answer.ok || answer.error.code !== 'not saved') throw new Error('saved');
    expect(answer.error.lines.map(({ batch, text }) => [batch, text.includes('"type":"stepFinished"')])).toEqual([
      ['b1', true],
    ]);
    expect(log.bench).toBe(before);
    expect(count(place, 'stepFinished')).toBe(written);
    await place.clock.pass(60_000);
    const again = await log.ask(strip(1));
    expect(again.ok && again.value.map(({ type }) => type)).toEqual(['stepFinished']);
    expect(count(place, 'stepFinished')).toBe(1);
    expect(openIn(log.bench)).toEqual(openIn(wholeBench(place)));
    expect(states(place)).toEqual(['unbroken']);
  });

  it('and another command asked instead finds what was written, and is decided on it', async () => {
    const { place, log, plan } = await failing();
    await plan(unheard, unheard);
    expect(codeOf(await log.ask(strip(1)))).toBe('not saved');
    expect(codeOf(await log.ask(strip(1, 2)))).toBe('not at this step');
    expect(codeOf(await log.ask(strip(2)))).toBeNull();
    expect(openIn(log.bench)).toEqual(openIn(wholeBench(place)));
  });

  it('an undo that nobody heard of takes back one command, however often it is asked', async () => {
    const { place, log, plan } = await failing();
    await granted(log, place, strip(1), strip(2));
    await plan(unheard, unheard);
    const undo: Command = { type: 'undo', batch: 'b1' };
    expect(codeOf(await log.ask(undo))).toBe('not saved');
    expect(codeOf(await log.ask(undo))).toBeNull();
    expect(count(place, 'voided')).toBe(1);
    expect(log.bench.batches['b1']?.connectors.map(({ stands }) => 'step' in stands && stands.step)).toEqual([1, 0, 0]);
    await granted(log, place, undo);
    expect(count(place, 'voided')).toBe(2);
  });

  it('a write that arrives after it was given up is found, and not doubled', async () => {
    const { place, log, replace } = await failing();
    const sound = memoryStore(place.memory);
    const held: (() => Promise<unknown>)[] = [];
    replace({
      ...sound,
      append: (...all) => {
        held.push(() => sound.append(...all));
        return new Promise(() => {});
      },
    });
    expect(codeOf(await asked(place, log.ask(strip(1))))).toBe('not saved');
    replace({
      ...sound,
      append: async (...all) => {
        for (const arrive of held.splice(0)) await arrive();
        return sound.append(...all);
      },
    });
    expect(codeOf(await log.ask(strip(1)))).toBeNull();
    expect(count(place, 'stepFinished')).toBe(1);
    expect(states(place)).toEqual(['unbroken']);
  });

  it('when the news of another window cannot be read: not saved, and fine the next time', async () => {
    const { place, log, plan } = await failing();
    const other = await startOn(place);
    await granted(other, place, strip(1));
    await plan(null, ...Array.from({ length: 6 }, () => lost));
    expect(codeOf(await log.ask(strip(2)))).toBe('not saved');
    await granted(log, place, strip(2));
    expect(openIn(log.bench)).toEqual(openIn(wholeBench(place)));
  });

  it('what the tablet noticed meanwhile is written before the next command, once', async () => {
    for (const fault of [lost, unheard]) {
      const { place, log, plan } = await failing();
      place.clock.sleep(600_000);
      await plan(fault, fault);
      const woke = await log.write([{ batch: 'bench', type: 'tabletWoke', v: 1, data: {} }]);
      expect(codeOf(woke)).toBe('not saved');
      await granted(log, place, strip(1));
      expect(typesIn(place).slice(-2)).toEqual(['tabletWoke', 'stepFinished']);
      expect(count(place, 'tabletWoke')).toBe(1);
      const [woken, last] = entriesIn(place).slice(-2);
      expect((last?.bench ?? 0) - (log.bench.batches['b1']?.opened.bench ?? 0)).toBeGreaterThan(600_000);
      expect(woken?.bench).toBeLessThanOrEqual(last?.bench ?? 0);
      expect(codeOf(await log.write([]))).toBeNull();
    }
  });

  it('no command passes what is owed', async () => {
    const { place, log, plan } = await failing();
    await plan(...Array.from({ length: 6 }, () => lost));
    await log.write([{ batch: 'bench', type: 'tabletWoke', v: 1, data: {} }]);
    expect(codeOf(await log.ask(strip(1)))).toBe('not saved');
    expect(count(place, 'stepFinished')).toBe(0);
  });

  it('at the first entry of the page: the bench can be read, and that entry comes before the next', async () => {
    const made = failingPlace();
    const first = await startOn(made.place, made.store);
    await openBatch(first, made.place, 'b1', 2);
    made.place.clock.reload();
    const store = memoryStore(made.place.memory);
    let writable = false;
    made.replace({
      ...store,
      append: (...all) =>
        writable ? store.append(...all) : Promise.reject(new DOMException('', 'QuotaExceededError')),
    });
    const log = await startOn(made.place, made.store);
    expect(Object.keys(log.bench.batches)).toEqual(['b1']);
    expect(codeOf(await log.write([]))).toBe('not saved');
    expect(codeOf(await log.ask(strip(1)))).toBe('not saved');
    writable = true;
    await granted(log, made.place, strip(1));
    expect(typesIn(made.place).slice(-2)).toEqual(['tabletStarted', 'stepFinished']);
    expect(codeOf(await log.write([]))).toBeNull();
    expect(states(made.place)).toEqual(['unbroken']);
  });

  it('when it cannot be read at all, the start says so', async () => {
    const made = failingPlace();
    await made.plan(lost, lost, lost, lost, lost, lost, lost, lost);
    await expect(startOn(made.place, made.store)).rejects.toBeInstanceOf(StoreError);
  });
});
