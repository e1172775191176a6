import { describe, expect, test } from 'vitest';
import { NotSavedError, StoreError } from '../../src/log/errors.ts';
import { emptyMemory, memoryStore } from '../../src/log/memory-store.ts';
import { patienceMs, steadyStore } from '../../src/log/steady-store.ts';
import type { OpenStore } from '../../src/log/store.ts';
import { held, linesAfter, textsOf } from '../contract/lines-to-store.ts';
import { fakeClock, settled } from '../fake/clock.ts';
import { faultyOpener, type Fault } from '../fake/faulty-store.ts';

const first = linesAfter(null, [held('b1', 'lunch'), held('b2', 'lunch')]);
const second = linesAfter(first.head, [held('b1', 'fire drill')]);

function steady(faults: readonly (Fault | null)[], faultsOfOpening: readonly (Fault | null)[] = []) {
  const memory = emptyMemory();
  const openMemory: OpenStore = () => Promise.resolve(memoryStore(memory));
  const clock = fakeClock();
  const { open, opened } = faultyOpener(openMemory, faults, faultsOfOpening);
  const went: string[] = [];
  const store = steadyStore(open, { after: clock.after, gone: (why) => went.push(why) });
  return { store, memory: memoryStore(memory), clock, opened, went };
}

const append = ({ store }: ReturnType<typeof steady>, made = first) =>
  store.append(made.expected, made.lines, made.head, [{ key: 'x', value: 'y' }]);

/** The outcome of a promise, looked at only when the test asks. */
function outcomeOf<Value>(promise: Promise<Value>): { value?: Value; error?: unknown } {
  const outcome: { value?: Value; error?: unknown } = {};
  promise.then(
    (value) => (outcome.value = value),
    (error: unknown) => (outcome.error = error),
  );
  return outcome;
}

describe('an append over a connection that fails once is saved once', () => {
  test.each<{ fault: Fault; waitMs: number }>([
    { fault: { what: 'lost', name: 'UnknownError' }, waitMs: 0 },
    { fault: { what: 'lost', name: 'InvalidStateError' }, waitMs: 0 },
    { fault: { what: 'lost', name: 'AbortError' }, waitMs: 0 },
    { fault: { what: 'unheard', name: 'UnknownError' }, waitMs: 0 },
    { fault: { what: 'lost, silent' }, waitMs: patienceMs.write },
    { fault: { what: 'unheard, silent' }, waitMs: patienceMs.write },
  ])('$fault', async ({ fault, waitMs }) => {
    const bench = steady([fault]);
    const outcome = outcomeOf(append(bench));
    await bench.clock.pass(Math.max(0, waitMs - 1));
    if (waitMs > 0) expect(outcome).toEqual({});
    await bench.clock.pass(1);
    expect(outcome).toEqual({ value: 'saved' });
    expect(await bench.memory.lines()).toEqual(first.lines);
    expect(bench.opened.map(({ closed }) => closed)).toEqual([true, false]);
    expect(bench.store.unsaved()).toEqual([]);
    expect(bench.clock.waiting()).toBe(0);
  });

  test('an opening that hangs', async () => {
    const bench = steady([], [{ what: 'lost, silent' }]);
    const outcome = outcomeOf(append(bench));
    await bench.clock.pass(patienceMs.open);
    expect(outcome).toEqual({ value: 'saved' });
  });

  test('an opening that fails', async () => {
    const bench = steady([], [{ what: 'lost', name: 'UnknownError' }]);
    expect(await append(bench)).toBe('saved');
  });
});

describe('an append that fails twice', () => {
  test('is told as not saved, with its lines kept', async () => {
    const bench = steady([
      { what: 'lost', name: 'UnknownError' },
      { what: 'lost', name: 'UnknownError' },
    ]);
    const error = await append(bench).catch((reason: unknown) => reason);
    expect(error).toBeInstanceOf(NotSavedError);
    expect(error).toMatchObject({ fault: { kind: 'broken', name: 'UnknownError' }, lines: first.lines });
    expect(bench.store.unsaved()).toEqual(first.lines);
    expect(await bench.memory.count()).toBe(0);
  });

  test('says how long it waited where nothing answered', async () => {
    const bench = steady([{ what: 'lost, silent' }, { what: 'lost, silent' }]);
    const outcome = outcomeOf(append(bench));
    await bench.clock.pass(2 * patienceMs.write - 1);
    expect(outcome).toEqual({});
    await bench.clock.pass(1);
    expect(outcome.error).toMatchObject({ fault: { kind: 'silent', doing: 'write', waitedMs: 3000 } });
    expect(String(outcome.error)).toContain('did not answer within 3 s');
  });

  test('is saved when it is tried again, and then no longer kept', async () => {
    const bench = steady([
      { what: 'lost', name: 'UnknownError' },
      { what: 'lost', name: 'UnknownError' },
    ]);
    await append(bench).catch(() => {});
    expect(await append(bench)).toBe('saved');
    expect(bench.store.unsaved()).toEqual([]);
    expect(await bench.memory.lines()).toEqual(first.lines);
  });

  test('counts as saved when tried again although it had arrived unheard both times', async () => {
    const bench = steady([
      { what: 'unheard', name: 'UnknownError' },
      { what: 'unheard', name: 'UnknownError' },
    ]);
    await append(bench).catch(() => {});
    expect(bench.store.unsaved()).toEqual(first.lines);
    expect(await append(bench)).toBe('saved');
    expect(bench.store.unsaved()).toEqual([]);
    expect(await bench.memory.count()).toBe(2);
  });

  test('stays kept when other lines took its place', async () => {
    const bench = steady([
      { what: 'lost', name: 'UnknownError' },
      { what: 'lost', name: 'UnknownError' },
    ]);
    await append(bench).catch(() => {});
    expect(await append(bench, linesAfter(null, [held('b9', 'anew')]))).toBe('saved');
    expect(await append(bench)).toBe('moved');
    expect(textsOf(bench.store.unsaved())).toEqual(textsOf(first.lines));
  });
});

describe('what another try cannot mend is told at once', () => {
  test.each([
    { name: 'QuotaExceededError', kind: 'full', words: 'no room left' },
    { name: 'VersionError', kind: 'newer', words: 'newer version' },
  ])('$kind', async ({ name, kind, words }) => {
    const bench = steady([{ what: 'lost', name }]);
    const error = await append(bench).catch((reason: unknown) => reason);
    expect(error).toMatchObject({ fault: { kind }, message: expect.stringContaining(words) });
    expect(bench.opened).toHaveLength(1);
    expect(bench.store.unsaved()).toEqual(first.lines);
  });

  test("a caller's mistake stays a mistake, and keeps nothing", async () => {
    const bench = steady([]);
    await expect(bench.store.append(null, [], first.head, [])).rejects.toBeInstanceOf(RangeError);
    expect(bench.store.unsaved()).toEqual([]);
    expect(bench.opened.map(({ closed }) => closed)).toEqual([false]);
  });
});

test('an append made after one that is being tried again waits for it', async () => {
  const bench = steady([{ what: 'lost, silent' }]);
  const outcomes = [outcomeOf(append(bench)), outcomeOf(append(bench, second))];
  await settled();
  expect(outcomes).toEqual([{}, {}]);
  await bench.clock.pass(patienceMs.write);
  expect(outcomes).toEqual([{ value: 'saved' }, { value: 'saved' }]);
  expect(await bench.memory.lines()).toEqual([...first.lines, ...second.lines]);
});

test('one that failed does not hold up the next', async () => {
  const bench = steady([
    { what: 'lost', name: 'UnknownError' },
    { what: 'lost', name: 'UnknownError' },
  ]);
  const outcomes = [outcomeOf(append(bench)), outcomeOf(append(bench))];
  await settled();
  expect(outcomes[0]?.error).toBeInstanceOf(NotSavedError);
  expect(outcomes[1]).toEqual({ value: 'saved' });
});

describe('a connection that is closed from outside', () => {
  test.each(['terminated', 'newer version'] as const)('%s: it is told, and the next use opens anew', async (why) => {
    const bench = steady([]);
    await append(bench);
    bench.opened[0]?.gone(why);
    expect(bench.went).toEqual([why]);
    expect(await append(bench, second)).toBe('saved');
    await settled();
    expect(bench.opened.map(({ closed }) => closed)).toEqual([true, false]);
  });
});

test('a read over a lost connection is tried once more, and then told', async () => {
  const fault: Fault = { what: 'lost', name: 'UnknownError' };
  const once = steady([fault]);
  expect(await once.store.count()).toBe(0);
  const twice = steady([fault, fault]);
  await expect(twice.store.count()).rejects.toMatchObject({ fault: { kind: 'broken', doing: 'read' } });
  expect(await twice.store.count()).toBe(0);
});

test('a connection that comes after nobody waits for it is closed', async () => {
  const memory = emptyMemory();
  const clock = fakeClock();
  const arrive: (() => void)[] = [];
  let closed = 0;
  const store = steadyStore(
    () =>
      new Promise((resolve) => arrive.push(() => resolve({ ...memoryStore(memory), close: () => void (closed += 1) }))),
    { after: clock.after },
  );
  const outcome = outcomeOf(store.count());
  await clock.pass(patienceMs.open);
  arrive[0]?.();
  await settled();
  expect(closed).toBe(1);
  arrive[1]?.();
  await settled();
  expect(outcome).toEqual({ value: 0 });
  expect(closed).toBe(1);
});

test('a closed store opens nothing anew', async () => {
  const bench = steady([]);
  await append(bench);
  bench.store.close();
  await settled();
  await expect(bench.store.count()).rejects.toBeInstanceOf(StoreError);
  await expect(append(bench, second)).rejects.toBeInstanceOf(NotSavedError);
  expect(bench.opened.map(({ closed }) => closed)).toEqual([true]);
});

test('a use that fails late does not throw away the connection that was opened since', async () => {
  const bench = steady([{ what: 'lost', name: 'InvalidStateError' }, { what: 'lost, silent' }]);
  const outcomes = [outcomeOf(bench.store.count()), outcomeOf(bench.store.count())];
  await settled();
  expect(outcomes).toEqual([{ value: 0 }, {}]);
  await bench.clock.pass(patienceMs.read);
  expect(outcomes).toEqual([{ value: 0 }, { value: 0 }]);
  expect(bench.opened.map(({ closed }) => closed)).toEqual([true, false]);
});
