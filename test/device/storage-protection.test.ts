import { expect, test } from 'vitest';
import { createStorageProtection } from '../../src/device/storage-protection.ts';

test('looking asks for nothing, asking may be granted', async () => {
  let granted = false;
  const storage = {
    persisted: () => Promise.resolve(granted),
    persist: () => Promise.resolve((granted = true)),
    estimate: () => Promise.resolve({ quota: 1000, usage: 400 }),
  };
  const protection = createStorageProtection({ navigator: { storage } });
  expect(protection.current).toEqual({ protection: 'unknown', freeBytes: null });
  expect(await protection.look()).toEqual({ protection: 'not protected', freeBytes: 600 });
  expect(await protection.ask()).toEqual({ protection: 'protected', freeBytes: 600 });
  expect(protection.current.protection).toBe('protected');
});

test('listeners hear changes only', async () => {
  const storage = { persisted: () => Promise.resolve(true) };
  const protection = createStorageProtection({ navigator: { storage } });
  const heard: string[] = [];
  protection.subscribe((state) => heard.push(state.protection));
  await protection.look();
  await protection.look();
  expect(heard).toEqual(['unknown', 'protected']);
});

test('the browser method keeps its owner', async () => {
  class Storage {
    readonly #kept = true;
    persisted() {
      return Promise.resolve(this.#kept);
    }
    estimate() {
      return Promise.resolve(this.#kept ? { quota: 5, usage: 9 } : {});
    }
  }
  const protection = createStorageProtection({ navigator: { storage: new Storage() } });
  expect(await protection.look()).toEqual({ protection: 'protected', freeBytes: 0 });
});

test('without the interface, or with one that fails, nothing is claimed', async () => {
  const bare = createStorageProtection({ navigator: {} });
  expect(await bare.ask()).toEqual({ protection: 'unknown', freeBytes: null });
  const failing = createStorageProtection({
    navigator: {
      storage: { persist: () => Promise.reject(new Error('no')), estimate: () => Promise.reject(new Error('no')) },
    },
  });
  expect(await failing.ask()).toEqual({ protection: 'unknown', freeBytes: null });
});
