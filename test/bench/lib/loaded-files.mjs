import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { openBrowser } from './browser.mjs';

/**
 * @typedef {'script' | 'style' | 'font' | 'other'} Kind
 * @typedef {{ path: string, kind: Kind, bytes: number, early: boolean }} LoadedFile
 *   bytes after gzip -9; early: asked for before the page could be used
 */

/** @param {string} path @returns {Kind} */
function kindOf(path) {
  if (/\.js$/.test(path)) return 'script';
  if (/\.css$/.test(path)) return 'style';
  return /\.woff2?$/.test(path) ? 'font' : 'other';
}

/**
 * What a browser that was never here asks for until the page can be used, and after that. The service worker is kept
 * out: it fetches every file of the app, but after the page works and without it.
 * @param {{ path: string, profile: string, address: string, folder: string, ready: string,
 *   prepare?: (context: import('@playwright/test').BrowserContext) => Promise<void> }} what
 *   `ready` is a selector of what makes the page usable
 * @returns {Promise<LoadedFile[]>}
 */
export async function loadedFiles({ path, profile, address, folder, ready, prepare }) {
  const browser = await openBrowser({ path, profile, serviceWorkers: 'block' });
  try {
    await prepare?.(browser);
    /** @type {Map<string, boolean>} */
    const asked = new Map();
    let early = true;
    const page = await browser.newPage();
    page.on('request', (request) => {
      const url = new URL(request.url());
      if (url.origin === new URL(address).origin && !asked.has(url.pathname)) asked.set(url.pathname, early);
    });
    await page.goto(`${address}/`);
    await page.locator(ready).first().waitFor({ timeout: 30_000 });
    early = false;
    await page.waitForTimeout(1500);
    return [...asked].flatMap(([name, wasEarly]) => {
      const content = readOr(join(folder, name === '/' ? 'index.html' : name));
      if (content === null) return [];
      return [{ path: name, kind: kindOf(name), bytes: gzipSync(content, { level: 9 }).length, early: wasEarly }];
    });
  } finally {
    await browser.close();
  }
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
