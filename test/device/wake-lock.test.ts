import { expect, test } from 'vitest';
import { createWakeLock } from '../../src/device/wake-lock.ts';
import { FakeWindow, settle } from '../fake/fake-window.ts';

class FakeHandle extends EventTarget {
  released = false;
  release(): Promise<void> {
    this.released = true;
    this.dispatchEvent(new Event('release'));
    return Promise.resolve();
  }
}

class WakeLockFakeWindow extends FakeWindow {
  answer: 'grant' | 'refuse' = 'grant';
  readonly handles: FakeHandle[] = [];
  asked = 0;
  readonly navigator = {
    wakeLock: {
      request: async () => {
        this.asked += 1;
        await Promise.resolve();
        if (this.answer === 'refuse') throw new Error('low battery');
        const handle = new FakeHandle();
        this.handles.push(handle);
        return handle;
      },
    },
  };
}

test('held while asked for, released after', async () => {
  const window = new WakeLockFakeWindow();
  const lock = createWakeLock(window);
  const heard: string[] = [];
  lock.subscribe((state) => heard.push(state));
  lock.hold();
  await settle();
  lock.letGo();
  await settle();
  expect(heard).toEqual(['released', 'held', 'released']);
  expect(window.handles.map((handle) => handle.released)).toEqual([true]);
});

test('a browser without it says so and stays so', async () => {
  const lock = createWakeLock(Object.assign(new FakeWindow(), { navigator: {} }));
  lock.hold();
  await settle();
  lock.letGo();
  expect(lock.current).toBe('absent');
});

test('hidden drops it, in view takes it again', async () => {
  const window = new WakeLockFakeWindow();
  const lock = createWakeLock(window);
  lock.hold();
  await settle();
  window.show('hidden');
  await window.handles[0]?.release();
  expect(lock.current).toBe('released');
  window.show('visible');
  await settle();
  expect([lock.current, window.handles.length]).toEqual(['held', 2]);
});

test.each(['pointerup', 'keydown'])('refused, then granted at the next %s', async (type) => {
  const window = new WakeLockFakeWindow();
  window.answer = 'refuse';
  const lock = createWakeLock(window);
  lock.hold();
  await settle();
  expect(lock.current).toBe('refused');
  window.answer = 'grant';
  window.dispatchEvent(new Event(type));
  await settle();
  expect(lock.current).toBe('held');
});

test('taken back by the device while in view counts as refused', async () => {
  const window = new WakeLockFakeWindow();
  const lock = createWakeLock(window);
  lock.hold();
  await settle();
  await window.handles[0]?.release();
  expect(lock.current).toBe('refused');
});

test('a grant that comes after it was let go is given back', async () => {
  const window = new WakeLockFakeWindow();
  const lock = createWakeLock(window);
  lock.hold();
  lock.letGo();
  await settle();
  expect(lock.current).toBe('released');
  expect(window.handles.map((handle) => handle.released)).toEqual([true]);
});

test('taps ask only while it is wanted and not held', async () => {
  const window = new WakeLockFakeWindow();
  const lock = createWakeLock(window);
  window.tap();
  await settle();
  lock.hold();
  window.tap();
  await settle();
  window.tap();
  await settle();
  expect(window.asked).toBe(1);
  lock.release();
  window.tap();
  await settle();
  expect([window.asked, lock.current]).toEqual([1, 'released']);
});
