import { expect, test } from 'vitest';
import { answerMs, takeWriter, type Writer, type WriterState } from '../../src/log/writer.ts';
import { fakeClock, settled } from '../fake/clock.ts';
import { fakeChannel, fakeLocks } from '../fake/locks.ts';

/** Windows of one origin, each with what it was told. */
function origin() {
  const locks = fakeLocks();
  const joinChannel = fakeChannel();
  const clock = fakeClock();
  const windows: Writer[] = [];
  async function openWindow(letGo: () => Promise<void> | void = () => {}, database = 'lintfree') {
    const told: (WriterState | 'let go')[] = [];
    const writer = await takeWriter(database, {
      locks,
      channel: joinChannel(),
      after: clock.after,
      changed: (state) => {
        if (state === 'writing') expect(windows.filter(({ current }) => current === 'writing').length).toBeLessThan(2);
        told.push(state);
      },
      letGo: () => {
        told.push('let go');
        return letGo();
      },
    });
    if (database === 'lintfree') windows.push(writer);
    return { writer, told };
  }
  return { openWindow, clock };
}

test('the only window writes', async () => {
  const { openWindow } = origin();
  const { writer, told } = await openWindow();
  expect(writer.current).toBe('writing');
  expect(told).toEqual(['writing']);
});

test('a second window waits, and writes when the first closes', async () => {
  const { openWindow, clock } = origin();
  const first = await openWindow();
  const second = await openWindow();
  expect(second.writer.current).toBe('waiting');
  await clock.pass(60_000);
  expect(second.told).toEqual(['waiting']);
  first.writer.close();
  await settled();
  expect(second.told).toEqual(['waiting', 'writing']);
});

test('two databases have a writer each', async () => {
  const { openWindow } = origin();
  await openWindow();
  const demo = await openWindow(undefined, 'lintfree-demo');
  expect(demo.writer.current).toBe('writing');
});

test('"use here": the other window closes its database before this one writes', async () => {
  const { openWindow, clock } = origin();
  let closeDatabase = () => {};
  const first = await openWindow(() => new Promise((resolve) => (closeDatabase = resolve)));
  const second = await openWindow();
  second.writer.useHere();
  await clock.pass(1000);
  expect(first.told).toEqual(['writing', 'lost', 'let go']);
  expect(second.told).toEqual(['waiting']);
  closeDatabase();
  await settled();
  expect(second.told).toEqual(['waiting', 'writing']);
  await clock.pass(answerMs);
  expect(first.writer.current).toBe('lost');
  expect(second.told).toEqual(['waiting', 'writing']);
  expect(clock.waiting()).toBe(0);
});

test('without an answer the lock is taken after 3 s, and the loser still closes its database', async () => {
  const { openWindow, clock } = origin();
  const first = await openWindow(() => new Promise(() => {}));
  const second = await openWindow();
  second.writer.useHere();
  await clock.pass(answerMs - 1);
  expect(second.told).toEqual(['waiting']);
  await clock.pass(1);
  expect(second.told).toEqual(['waiting', 'writing']);
  expect(first.told).toEqual(['writing', 'lost', 'let go']);
});

test('a window that is deaf to messages loses the lock all the same', async () => {
  const locks = fakeLocks();
  const clock = fakeClock();
  const told: string[] = [];
  const deaf = await takeWriter('lintfree', {
    locks,
    channel: fakeChannel()(),
    changed: (state) => told.push(state),
    letGo: () => void told.push('let go'),
  });
  const other = await takeWriter('lintfree', {
    locks,
    channel: fakeChannel()(),
    after: clock.after,
    changed: () => {},
    letGo: () => {},
  });
  other.useHere();
  await clock.pass(answerMs);
  expect(told).toEqual(['writing', 'lost', 'let go']);
  expect([deaf.current, other.current]).toEqual(['lost', 'writing']);
});

test('a loser may ask back', async () => {
  const { openWindow } = origin();
  const first = await openWindow();
  const second = await openWindow();
  second.writer.useHere();
  await settled();
  first.writer.useHere();
  await settled();
  expect(first.told).toEqual(['writing', 'lost', 'let go', 'writing']);
  expect(second.told).toEqual(['waiting', 'writing', 'lost', 'let go']);
});

test('a loser does not come back by itself', async () => {
  const { openWindow } = origin();
  const first = await openWindow();
  const second = await openWindow();
  second.writer.useHere();
  await settled();
  second.writer.close();
  await settled();
  expect(first.writer.current).toBe('lost');
});

test('of several waiting windows the one that asks writes, not the one that waited longest', async () => {
  const { openWindow, clock } = origin();
  const first = await openWindow();
  const patient = await openWindow();
  const asking = await openWindow();
  asking.writer.useHere();
  await clock.pass(100);
  expect(first.told).toEqual(['writing', 'lost', 'let go']);
  expect(patient.told).toEqual(['waiting']);
  expect(asking.told).toEqual(['waiting', 'writing']);
  asking.writer.close();
  await settled();
  expect(patient.told).toEqual(['waiting', 'writing']);
});

test('"use here" in the writing window does nothing', async () => {
  const { openWindow, clock } = origin();
  const { writer, told } = await openWindow();
  writer.useHere();
  await clock.pass(answerMs);
  expect(told).toEqual(['writing']);
});

test('a window that closes while it asks takes nothing', async () => {
  const { openWindow, clock } = origin();
  const first = await openWindow(() => new Promise(() => {}));
  const second = await openWindow();
  second.writer.useHere();
  second.writer.close();
  await clock.pass(answerMs);
  expect(second.told).toEqual(['waiting']);
  expect(first.told).toEqual(['writing', 'lost', 'let go']);
  expect(clock.waiting()).toBe(0);
});

test('where there are no locks every window writes', async () => {
  const told: WriterState[] = [];
  const options = { locks: undefined, changed: (state: WriterState) => void told.push(state), letGo: () => {} };
  const writer = await takeWriter('lintfree', { ...options, channel: fakeChannel()() });
  writer.useHere();
  expect(writer.current).toBe('writing');
  expect(told).toEqual(['writing']);
});
