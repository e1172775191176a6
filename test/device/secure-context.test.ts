import { expect, test } from 'vitest';
import { checkOffline, type OfflineCheckWindow } from '../../src/device/secure-context.ts';
import { FakeWindow, settle } from '../fake/fake-window.ts';

const setUp = (extra: Partial<OfflineCheckWindow> = {}) => {
  const fake = new FakeWindow();
  const registered: string[] = [];
  const matched: string[] = [];
  const window: OfflineCheckWindow = {
    isSecureContext: true,
    document: { baseURI: 'https://bench.test/lintfree/#/shift' },
    navigator: {
      serviceWorker: {
        register: (url) => Promise.resolve(registered.push(url)),
        ready: Promise.resolve({}),
      },
    },
    caches: {
      match: (url) => {
        matched.push(url);
        return Promise.resolve(new Response('<!doctype html>'));
      },
    },
    setTimeout: fake.setTimeout,
    ...extra,
  };
  return { window, registered, matched, time: fake.time };
};

test('all four conditions met', async () => {
  const { window, registered, matched } = setUp();
  expect(await checkOffline(window)).toEqual({ ok: true, value: null });
  expect(registered).toEqual(['https://bench.test/lintfree/service-worker.js']);
  expect(matched).toEqual(['https://bench.test/lintfree/']);
});

const ready = Promise.resolve({});
const refuses = { serviceWorker: { register: () => Promise.reject(new Error('An SSL certificate error')), ready } };

test.each<[string, Partial<OfflineCheckWindow>]>([
  ['not secure', { isSecureContext: false }],
  ['no service worker', { navigator: {} }],
  ['registration refused', { navigator: refuses }],
  ['nothing kept', { caches: { match: () => Promise.resolve(undefined) } }],
  ['nothing kept', { caches: { match: () => Promise.resolve(new Response('')) } }],
  ['nothing kept', { caches: { match: () => Promise.reject(new Error('gone')) } }],
])('%s', async (error, extra) => {
  expect(await checkOffline(setUp(extra).window)).toEqual({ ok: false, error });
});

test('an install that never ends is given up', async () => {
  const never = new Promise<never>(() => undefined);
  const { window, time } = setUp({ navigator: { serviceWorker: { register: () => Promise.resolve(), ready: never } } });
  const result = checkOffline(window, 30_000);
  await settle();
  time.pass(30_000);
  expect(await result).toEqual({ ok: false, error: 'nothing kept' });
});
