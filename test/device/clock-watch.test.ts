import { expect, test } from 'vitest';
import { watchClock } from '../../src/device/clock-watch.ts';
import { startTick } from '../../src/device/tick.ts';
import { FakeWindow } from '../fake/fake-window.ts';

const setUp = () => {
  const window = new FakeWindow();
  const { time } = window;
  const tick = startTick(window, () => {
    throw new Error('the page ticks in these tests');
  });
  const told: string[] = [];
  const clock = { read: () => ({ wall: time.wallMs, mono: time.monoMs }) };
  const watch = watchClock(
    { clock, tick, onJump: (jump) => told.push(jump.kind), onSecond: () => told.push('second') },
    window,
  );
  const take = () => told.splice(0);
  return { window, time, watch, take };
};

test('a quiet minute is sixty seconds and no jump', () => {
  const { time, take } = setUp();
  time.pass(60_000);
  expect(take()).toEqual(Array.from({ length: 60 }, () => 'second'));
});

test('a sleep is told at the first tick, before the second', () => {
  const { time, take } = setUp();
  time.pass(1000);
  take();
  time.sleep(600_000, 600_000);
  time.pass(1);
  expect(take()).toEqual(['tabletWoke', 'second']);
  time.pass(2000);
  expect(take()).toEqual(['second', 'second']);
});

test('a clock set in view is told once', () => {
  const { time, take } = setUp();
  time.wallMs -= 3_600_000;
  time.pass(250);
  expect(take()).toEqual(['clockSet', 'second']);
});

test('screen off with a monotonic clock that stands still is a sleep', () => {
  const { window, time, take } = setUp();
  window.show('hidden');
  take();
  time.sleep(1_800_000, 20);
  window.show('visible');
  expect(take()).toEqual(['tabletWoke', 'second']);
});

test('a page in view again reckons a new clock as set', () => {
  const { window, time, take } = setUp();
  window.show('hidden');
  time.pass(1000);
  window.show('visible');
  take();
  time.wallMs += 3_600_000;
  time.pass(250);
  expect(take()).toEqual(['clockSet', 'second']);
});

test('a freeze is told even when it was short', () => {
  const { window, time, take } = setUp();
  window.document.dispatchEvent(new Event('freeze'));
  time.sleep(900, 900);
  window.document.dispatchEvent(new Event('resume'));
  expect(take()).toEqual(['tabletWoke', 'second']);
});

test('a page out of the back-forward cache was frozen; a first show was not', () => {
  const { window, take } = setUp();
  window.dispatchEvent(Object.assign(new Event('pageshow'), { persisted: false }));
  expect(take()).toEqual(['second']);
  window.dispatchEvent(Object.assign(new Event('pageshow'), { persisted: true }));
  expect(take()).toEqual(['tabletWoke', 'second']);
});

test('focus works everything out at once', () => {
  const { window, take } = setUp();
  window.dispatchEvent(new Event('focus'));
  expect(take()).toEqual(['second']);
});

test('a look before an entry finds the jump, and no later tick finds it again', () => {
  const { time, watch, take } = setUp();
  time.wallMs += 7000;
  expect(watch.look()?.kind).toBe('clockSet');
  expect(watch.look()).toBeNull();
  expect(take()).toEqual(['clockSet']);
});

test('nothing is told after release', () => {
  const { window, time, watch, take } = setUp();
  watch.release();
  time.pass(10_000);
  window.show('hidden');
  window.dispatchEvent(new Event('focus'));
  expect(take()).toEqual([]);
});
