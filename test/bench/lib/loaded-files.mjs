import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { noteUsable, openBrowser, usableAtMs } from './browser.mjs';

/**
 * @typedef {'script' | 'style' | 'font' | 'registration' | 'other'} Kind
 * @typedef {{ path: string, kind: Kind, bytes: number, early: boolean }} LoadedFile
 *   bytes after gzip -9; early: asked for before the page could be used
 */

/** @param {string} path @param {Buffer} content @returns {Kind} */
function kindOf(path, content) {
  // The library that registers the service worker names itself so, also when minified.
  if (content.includes('workbox:window')) return 'registration';
  if (/\.js$/.test(path)) return 'script';
  if (/\.css$/.test(path)) return 'style';
  return /\.woff2?$/.test(path) ? 'font' : 'other';
}

/**
 * What a browser that was never here asks for until the page can be used, and after that. The service worker is kept
 * out: it fetches every file of the app, but after the page works and without it.
 * @param {{ path: string, profile: string, address: string, folder: string, ready: string }} what
 *   `ready` is a selector of what makes the page usable
 * @returns {Promise<LoadedFile[]>}
 */
export async function loadedFiles({ path, profile, address, folder, ready }) {
  const browser = await openBrowser({ path, profile, serviceWorkers: 'block' });
  try {
    const page = await browser.newPage();
    await page.addInitScript(noteUsable, ready);
    const { origin } = new URL(address);
    /** @type {Set<string>} */
    const asked = new Set();
    page.on('request', (request) => {
      const url = new URL(request.url());
      if (url.origin === origin) asked.add(url.pathname);
    });
    await page.goto(`${address}/`);
    await page.waitForFunction(usableAtMs, null, { timeout: 60_000 });
    await page.waitForTimeout(2000);
    // What the page's own record does not hold counts as asked for before.
    const late = new Set(await page.evaluate(askedForLate));
    return [...asked].flatMap((name) => {
      const content = readOr(join(folder, name === '/' ? 'index.html' : name));
      if (content === null) return [];
      const { length } = gzipSync(content, { level: 9 });
      return [{ path: name, kind: kindOf(name, content), bytes: length, early: !late.has(name) }];
    });
  } finally {
    await browser.close();
  }
}

/** Runs in the page: what it asked for after it could be used. */
function askedForLate() {
  const at = /** @type {any} */ (globalThis).usableAtMs;
  const late = performance.getEntriesByType('resource').filter(({ startTime }) => startTime > at);
  return late.map(({ name }) => new URL(name).pathname);
}

/** @param {string} file */
function readOr(file) {
  try {
    return readFileSync(file);
  } catch {
    return null;
  }
}

/** @param {readonly LoadedFile[]} files @param {Kind[]} kinds @param {boolean} early */
export function bytesOf(files, kinds, early) {
  return files
    .filter((file) => file.early === early && kinds.includes(file.kind))
    .reduce((sum, { bytes }) => sum + bytes, 0);
}
