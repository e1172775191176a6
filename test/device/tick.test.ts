import { expect, test } from 'vitest';
import { startTick, type TickWorker } from '../../src/device/tick.ts';
import { FakeWindow } from '../fake/fake-window.ts';

class FakeWorker extends EventTarget implements TickWorker {
  ended = false;
  terminate() {
    this.ended = true;
  }
}

const setUp = () => {
  const window = new FakeWindow();
  const worker = new FakeWorker();
  const tick = startTick(window, () => worker);
  let ticks = 0;
  const stop = tick.onTick(() => void (ticks += 1));
  return { window, worker, tick, stop, count: () => ticks };
};

test('the page ticks until the worker does, then the worker alone', () => {
  const { window, worker, tick, count } = setUp();
  window.time.pass(1000);
  expect([tick.current, count()]).toEqual(['page timer', 4]);
  worker.dispatchEvent(new Event('message'));
  window.time.pass(1000);
  expect([tick.current, count(), window.time.timerCount]).toEqual(['worker', 5, 0]);
});

test('a worker that fails hands back to the page, and says so', () => {
  const { window, worker, tick, count } = setUp();
  worker.dispatchEvent(new Event('message'));
  worker.dispatchEvent(new Event('error'));
  worker.dispatchEvent(new Event('error'));
  window.time.pass(500);
  expect([tick.current, count(), window.time.timerCount]).toEqual(['page timer', 3, 1]);
});

test('a browser that refuses workers still ticks', () => {
  const window = new FakeWindow();
  const tick = startTick(window, () => {
    throw new Error('refused');
  });
  let ticks = 0;
  tick.onTick(() => void (ticks += 1));
  window.time.pass(500);
  expect([tick.current, ticks]).toEqual(['page timer', 2]);
});

test('release ends the worker and every timer', () => {
  const { window, worker, tick, count } = setUp();
  tick.release();
  window.time.pass(1000);
  worker.dispatchEvent(new Event('message'));
  expect([worker.ended, window.time.timerCount, count()]).toEqual([true, 0, 0]);
});

test('a listener that left hears nothing more', () => {
  const { worker, stop, count } = setUp();
  stop();
  worker.dispatchEvent(new Event('message'));
  expect(count()).toBe(0);
});
