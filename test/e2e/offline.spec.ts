import { expect, test, type BrowserContext, type Page } from '@playwright/test';
import { cpSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { serve, type Serving } from '../../.ci/lib/serve.mjs';
import { filesOf, makeNextBuild, nextName } from './next-build.ts';

const build = process.env.LINTFREE_BUILD ?? fileURLToPath(new URL('../../build', import.meta.url));
const folder = mkdtempSync(join(tmpdir(), 'lintfree-offline-'));
const now = join(folder, 'now');
const next = join(folder, 'next');
let serving: Serving;
let port = 0;

/** These tests stop their server, so they have one of their own. */
const start = async (from: string) => {
  serving = await serve({ folder: from, port });
  port = Number(new URL(serving.address).port);
};

test.beforeAll(() => {
  cpSync(build, now, { recursive: true });
  makeNextBuild(now, next);
});
test.afterAll(() => rmSync(folder, { recursive: true, force: true }));
test.beforeEach(() => start(now));
test.afterEach(() => serving.close());

/** The app stands on the page, whatever its words are. */
const hasOpened = (page: Page) => page.waitForFunction(() => document.body.innerText.trim() !== '');

const openFirst = async (context: BrowserContext, path = '/') => {
  const page = await context.newPage();
  await page.goto(serving.address + path);
  await hasOpened(page);
  await page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
  return page;
};

const versionOf = (page: Page) =>
  page.evaluate(() => {
    const script = document.querySelector<HTMLLinkElement>('link[rel=modulepreload]')?.href ?? 'none';
    return script.endsWith('-next.js') ? 'next' : 'now';
  });

/** What lies in the tablet's own store, without the leading slash. */
const keptPaths = (page: Page) =>
  page.evaluate(async () => {
    const stores = await Promise.all((await caches.keys()).map((name) => caches.open(name)));
    const requests = (await Promise.all(stores.map((store) => store.keys()))).flat();
    return requests.map((request) => new URL(request.url).pathname.slice(1));
  });

const waitForNext = (page: Page) =>
  page.evaluate(async () => {
    const registration = await navigator.serviceWorker.ready;
    await registration.update();
    while (registration.waiting === null) await new Promise((resolve) => setTimeout(resolve, 50));
  });

/** What the consent of a person comes down to; this page itself was not asked. */
const takeOver = (page: Page) =>
  page.evaluate(async () => {
    const taken = new Promise((resolve) => navigator.serviceWorker.addEventListener('controllerchange', resolve));
    const { serviceWorker } = navigator;
    const ask = async () => (await serviceWorker.ready).waiting?.postMessage({ type: 'SKIP_WAITING' });
    // A busy machine may stop the waiting worker between the message and its taking: asked again, as a person would.
    const again = setInterval(() => void ask(), 1000);
    await ask();
    await taken;
    clearInterval(again);
  });

test('after the first load every file of the build is kept on the tablet', async ({ context }) => {
  const page = await openFirst(context);
  const kept = await keptPaths(page);
  const needless = /^(service-worker\.js|index\.html|_app\/version\.json|\..*|.*\.woff)$/;
  const needed = filesOf(now).filter((path) => !needless.test(path));
  expect(needed.filter((path) => /tick-worker|\.woff2$/.test(path)).length).toBeGreaterThanOrEqual(2);
  expect(needed.filter((path) => !kept.includes(path))).toEqual([]);
  expect(kept).toContain('');
});

test('with the server stopped it reloads, opens in a new tab, at a deep address and as index.html', async ({
  context,
}) => {
  const page = await openFirst(context);
  await serving.close();
  const problems: string[] = [];
  context.on('requestfailed', (request) => {
    if (!request.url().endsWith('/service-worker.js')) problems.push(request.url());
  });
  context.on('weberror', (error) => problems.push(error.error().message));
  await page.reload();
  await hasOpened(page);
  for (const path of ['/', '/#/settings', '/index.html', '/?from=home-screen']) {
    const tab = await context.newPage();
    await tab.goto(serving.address + path);
    await hasOpened(tab);
    await tab.close();
  }
  expect(problems).toEqual([]);
});

test('the tick comes from a worker, also offline', async ({ context }) => {
  const page = await openFirst(context);
  await serving.close();
  const worker = page.waitForEvent('worker');
  await page.reload();
  expect((await worker).url()).toMatch(/\/workers\/tick-worker-/);
});

test('a new version waits: no reload takes it and nothing reloads by itself', async ({ context }) => {
  const page = await openFirst(context);
  await serving.close();
  await start(next);
  await waitForNext(page);
  await page.reload();
  await hasOpened(page);
  expect(await versionOf(page)).toBe('now');
  expect(await page.evaluate(async () => (await navigator.serviceWorker.ready).waiting?.state)).toBe('installed');

  let loads = 0;
  page.on('load', () => (loads += 1));
  await takeOver(page);
  await page.waitForTimeout(500);
  expect([loads, await versionOf(page)]).toEqual([0, 'now']);
});

test('the new version is taken without the network, at the same address', async ({ context }) => {
  const page = await openFirst(context, '/#/settings');
  await serving.close();
  await start(next);
  await waitForNext(page);
  await serving.close();
  await takeOver(page);
  await page.reload();
  await hasOpened(page);
  expect(await versionOf(page)).toBe('next');
  expect(new URL(page.url()).hash).toBe('#/settings');
});

test('a window of the old version never misses a part of it; once it is gone, the old parts go', async ({
  context,
}) => {
  const page = await openFirst(context);
  const other = await openFirst(context);
  await serving.close();
  await start(next);
  await waitForNext(page);
  await takeOver(page);
  await page.reload();
  await hasOpened(page);
  const parts = filesOf(now).filter((path) => /^_app\/immutable\/(chunks|nodes|workers)\/.*\.js$/.test(path));
  // Without the browser's own cache, which might have them by chance.
  const statuses = (paths: string[]) =>
    other.evaluate(
      (each) => Promise.all(each.map(async (path) => (await fetch(path, { cache: 'no-store' })).status)),
      paths,
    );
  expect(await versionOf(other)).toBe('now');
  expect(new Set(await statuses(parts))).toEqual(new Set([200]));
  // The framework would reload a page that reads of a newer version.
  expect(await statuses(['_app/version.json'])).toEqual([204]);

  await page.close();
  await other.reload();
  await hasOpened(other);
  expect(await versionOf(other)).toBe('next');
  await expect.poll(async () => (await keptPaths(other)).filter((path) => parts.includes(path))).toEqual([]);
  expect(new Set(await statuses(parts.map(nextName)))).toEqual(new Set([200]));
});

test('the manifest can be installed: icons of the sizes that it names', async ({ request }) => {
  interface Manifest {
    start_url: string;
    scope: string;
    display: string;
    icons: { src: string; sizes: string; purpose?: string }[];
  }
  const manifest = (await (await request.get(`${serving.address}/manifest.webmanifest`)).json()) as Manifest;
  expect(manifest).toMatchObject({ start_url: './', scope: './', display: 'standalone' });
  expect(manifest.icons.map((icon) => `${icon.sizes} ${icon.purpose ?? 'any'}`).sort()).toEqual(
    ['192x192 any', '192x192 maskable', '512x512 any', '512x512 maskable', 'any any'].sort(),
  );
  for (const icon of manifest.icons) {
    const bytes = await (await request.get(`${serving.address}/${icon.src}`)).body();
    if (icon.sizes === 'any') expect(bytes.toString('utf8')).toContain('<svg');
    // A PNG says its width and height in bytes 16 to 23.
    else expect(`${bytes.readUInt32BE(16)}x${bytes.readUInt32BE(20)}`).toBe(icon.sizes);
  }
});
