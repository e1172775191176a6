import { expect, test } from 'vitest';
import { createAppUpdate } from '../../src/device/app-update.ts';
import { settle } from '../fake/fake-window.ts';
import { FakeWorker, ServiceWorkerFakeWindow } from '../fake/fake-window-service-worker.ts';

/** Message ports answer in a task of their own. */
const answer = async () => {
  for (let turn = 0; turn < 4; turn += 1) await new Promise((resolve) => setImmediate(resolve));
  await settle();
};

const start = async (window = new ServiceWorkerFakeWindow()) => {
  const update = createAppUpdate({ appVersion: 'v1', window, connect: window.connect });
  const heard: string[] = [];
  update.subscribe((state) => heard.push(state));
  await answer();
  return { window, update, heard };
};

const startWithWaiting = async () => {
  const window = new ServiceWorkerFakeWindow();
  window.withActive();
  const begun = await start(window);
  const next = window.install();
  window.installed(next);
  await answer();
  return { ...begun, next };
};

test('a browser without service workers', async () => {
  const window = new ServiceWorkerFakeWindow();
  const bare = Object.assign(new ServiceWorkerFakeWindow(), { navigator: {} });
  const update = createAppUpdate({ appVersion: 'v1', window: bare, connect: window.connect });
  await answer();
  expect([update.current, await update.checkNow(), window.scripts.length]).toEqual(['unsupported', 'unreachable', 0]);
});

test('first visit: installing until every file is counted; the first claim reloads nothing', async () => {
  const window = new ServiceWorkerFakeWindow();
  const worker = new FakeWorker();
  window.registration.installing = worker;
  const { heard } = await start(window);
  window.installed(worker);
  window.activate(worker);
  await answer();
  expect(heard).toEqual(['installing', 'ready offline']);
  expect(window.reloads).toBe(0);
  expect(window.scripts).toEqual(['https://bench.test/lintfree/service-worker.js']);
  expect(worker.asked[0]).toEqual({ type: 'TAKE_STOCK', appVersion: 'v1' });
});

test('a file that is missing is no "ready offline"', async () => {
  const window = new ServiceWorkerFakeWindow();
  window.withActive().missing = 1;
  const { update } = await start(window);
  expect(update.current).toBe('failed');
});

test('a worker that does not answer is no "ready offline", and is asked again when the page comes back', async () => {
  const window = new ServiceWorkerFakeWindow();
  const worker = window.withActive();
  worker.missing = null;
  const { update } = await start(window);
  expect(update.current).toBe('installing');
  window.time.pass(10_000);
  await answer();
  expect(update.current).toBe('failed');
  worker.missing = 0;
  window.show('visible');
  await answer();
  expect(update.current).toBe('ready offline');
});

test('refused registration and failed install say so, and are tried again when the network comes back', async () => {
  const window = new ServiceWorkerFakeWindow();
  window.refuses = true;
  const { update } = await start(window);
  expect(update.current).toBe('failed');
  window.refuses = false;
  window.registration.installing = new FakeWorker();
  window.dispatchEvent(new Event('online'));
  await answer();
  expect(update.current).toBe('installing');
  window.installFails(window.registration.installing);
  expect(update.current).toBe('failed');
});

test('an update waits for consent, takes over and reloads once', async () => {
  const { window, update, heard, next } = await startWithWaiting();
  expect(update.current).toBe('update waiting');
  window.time.pass(600_000);
  expect([window.skips, window.reloads]).toEqual([0, 0]);
  update.accept();
  update.accept();
  expect([update.current, window.skips, window.reloads]).toEqual(['updating', 1, 0]);
  window.activate(next);
  window.container.dispatchEvent(new Event('controllerchange'));
  await answer();
  expect(window.reloads).toBe(1);
  expect(heard).toEqual(['installing', 'ready offline', 'update waiting', 'updating']);
});

test('an update in a page that is open since the very first visit reloads after consent', async () => {
  const window = new ServiceWorkerFakeWindow();
  const first = new FakeWorker();
  window.registration.installing = first;
  const { update } = await start(window);
  window.installed(first);
  window.activate(first);
  await answer();
  const next = window.install();
  window.installed(next);
  update.accept();
  window.activate(next);
  expect(window.reloads).toBe(1);
});

test('a worker that waits already at page load is offered', async () => {
  const window = new ServiceWorkerFakeWindow();
  window.withActive();
  const waiting = new FakeWorker();
  waiting.state = 'installed';
  window.registration.waiting = waiting;
  const { update, heard } = await start(window);
  expect(heard).toEqual(['installing', 'update waiting']);
  update.accept();
  window.activate(waiting);
  expect(window.reloads).toBe(1);
});

test('a window that another one took over asks too, and reloads only by consent', async () => {
  const { window, update, next } = await startWithWaiting();
  window.activate(next);
  await answer();
  expect([update.current, window.reloads]).toEqual(['update waiting', 0]);
  update.accept();
  expect([window.reloads, window.skips]).toEqual([1, 0]);
});

test('a waiting worker that does not get control is offered again', async () => {
  const { window, update } = await startWithWaiting();
  update.accept();
  window.time.pass(10_000);
  await answer();
  expect([update.current, window.reloads]).toEqual(['update waiting', 0]);
});

test('a second update after one that failed is still noticed', async () => {
  const window = new ServiceWorkerFakeWindow();
  window.withActive();
  const { update } = await start(window);
  window.installFails(window.install());
  expect(update.current).toBe('ready offline');
  window.installed(window.install());
  expect(update.current).toBe('update waiting');
});

test('an update found while files are counted is not forgotten', async () => {
  const window = new ServiceWorkerFakeWindow();
  const active = window.withActive();
  active.missing = null;
  const { update } = await start(window);
  window.installed(window.install());
  window.time.pass(10_000);
  await answer();
  expect(update.current).toBe('update waiting');
});

test('looks for a new version every hour, and when asked', async () => {
  const window = new ServiceWorkerFakeWindow();
  window.withActive();
  const { update } = await start(window);
  window.time.pass(3_600_000);
  await answer();
  expect(window.updates).toBe(1);
  expect(await update.checkNow()).toBe('none');
  window.install();
  expect(await update.checkNow()).toBe('found');
  window.refuses = true;
  expect(await update.checkNow()).toBe('unreachable');
  expect(update.current).toBe('ready offline');
});

test('after release nothing is heard and no timer is left', async () => {
  const { window, update, next } = await startWithWaiting();
  update.accept();
  update.release();
  window.activate(next);
  window.show('visible');
  await answer();
  expect([window.reloads, window.time.timerCount]).toEqual([0, 0]);
});
