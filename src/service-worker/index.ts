/// <reference no-default-lib="true"/>
/// <reference lib="esnext" />
/// <reference lib="webworker" />
/// <reference types="@sveltejs/kit" />
import { base, build, files, prerendered, version } from '$service-worker';
import { PrecacheController } from 'workbox-precaching';
import type { ServiceWorkerMessage, Stock } from '../device/service-worker-message.ts';
import { precacheList } from './precache-list.ts';
import { clearOlder, countMissing, type Stockroom } from './stock.ts';

const worker = globalThis.self as unknown as ServiceWorkerGlobalScope;

const precache = new PrecacheController();
precache.addToCacheList(precacheList({ base, build, files, prerendered, version }));

const openCache = () => worker.caches.open(precache.strategy.cacheName);
const wantedKeys = () => precache.getURLsToCacheKeys().values();

const room: Stockroom = {
  keys: async () => (await (await openCache()).keys()).map((request) => request.url),
  remove: async (key) => (await openCache()).delete(key),
  fetch: async (key) => (await openCache()).add(key),
  quiet: async () => {
    const windows = await worker.clients.matchAll({ type: 'window', includeUncontrolled: true });
    return windows.length <= 1 && worker.registration.installing === null && worker.registration.waiting === null;
  },
};

const takeStock = async (appVersion: string): Promise<Stock> => {
  const stock = { missing: await countMissing(room, wantedKeys()) };
  if (appVersion === version) await clearOlder(room, wantedKeys());
  return stock;
};

// The controller waits for its own work; `activate` of the library is left out, see `clearOlder`.
worker.addEventListener('install', (event) => void precache.install(event));
worker.addEventListener('activate', (event) => event.waitUntil(worker.clients.claim()));

worker.addEventListener('message', (event) => {
  const message = event.data as ServiceWorkerMessage | undefined;
  if (message?.type === 'SKIP_WAITING') void worker.skipWaiting();
  if (message?.type === 'TAKE_STOCK') {
    const port = event.ports[0];
    event.waitUntil(takeStock(message.appVersion).then((stock) => port?.postMessage(stock)));
  }
});

/** A part of an older version, for a window of that version. */
const fromOlderVersion = async (request: Request): Promise<Response> => {
  const cache = await openCache();
  return (await cache.match(request.url, { ignoreVary: true })) ?? fetch(request);
};

worker.addEventListener('fetch', (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (request.method !== 'GET' || url.origin !== worker.location.origin) return;
  if (url.pathname === `${base}/_app/version.json`) {
    // The framework reloads a page by itself once it reads a newer version here; an empty answer tells it nothing.
    event.respondWith(new Response(null, { status: 204 }));
    return;
  }
  const path = url.pathname === `${base}/index.html` ? `${base}/` : url.pathname;
  const cacheKey = precache.getCacheKeyForURL(path);
  if (cacheKey !== undefined) event.respondWith(precache.strategy.handle({ event, request, params: { cacheKey } }));
  else if (path.startsWith(`${base}/_app/immutable/`)) event.respondWith(fromOlderVersion(request));
});
