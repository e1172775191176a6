import { usable } from './browser.mjs';

/** As in the app: the database of real work. */
const database = 'lintfree';
const atOnce = 10_000;

/**
 * Puts a log into the app's own database in place of what is there. The app makes the database first, so that its shape
 * is the app's; it then finds no derived rows, and makes them from the lines as after an update.
 * @param {import('@playwright/test').BrowserContext} browser
 * @param {string} address
 * @param {import('./shop-log.ts').ShopLog} log
 * @returns {Promise<{ writeMs: number, rebuildMs: number }>}
 */
export async function fillDatabase(browser, address, log) {
  const page = await browser.newPage();
  await page.goto(`${address}/`);
  await page.locator(usable).waitFor();
  // A page of the same origin without the app, so that nobody else writes.
  await page.goto(`${address}/icon.svg`);
  const begun = Date.now();
  await page.evaluate(emptyStores, database);
  for (let from = 0; from < log.lines.length; from += atOnce) {
    // As one text: handing over many small objects takes longer than writing them.
    const rows = JSON.stringify(log.lines.slice(from, from + atOnce));
    await page.evaluate(putRows, { database, store: 'lines', rows });
  }
  await page.evaluate(putRows, { database, store: 'heads', rows: JSON.stringify([log.head]) });
  const own = [{ key: 'own', value: log.head.log }];
  await page.evaluate(putRows, { database, store: 'derived', rows: JSON.stringify(own) });
  const writeMs = Date.now() - begun;
  const opened = Date.now();
  await page.goto(`${address}/`);
  await page.locator(usable).waitFor({ timeout: 120_000 });
  const rebuildMs = Date.now() - opened;
  await page.close();
  return { writeMs, rebuildMs };
}

/* The functions below run in the page. */

/** @param {string} name @returns {Promise<void>} */
function emptyStores(name) {
  return new Promise((resolve, reject) => {
    const opening = indexedDB.open(name);
    opening.onerror = () => reject(opening.error);
    opening.onsuccess = () => {
      const stores = [...opening.result.objectStoreNames];
      const transaction = opening.result.transaction(stores, 'readwrite');
      for (const store of stores) transaction.objectStore(store).clear();
      transaction.onabort = () => reject(transaction.error);
      transaction.oncomplete = () => {
        opening.result.close();
        resolve();
      };
    };
  });
}

/** @param {{ database: string, store: string, rows: string }} what `rows` as JSON @returns {Promise<void>} */
function putRows({ database: name, store, rows }) {
  return new Promise((resolve, reject) => {
    const opening = indexedDB.open(name);
    opening.onerror = () => reject(opening.error);
    opening.onsuccess = () => {
      const transaction = opening.result.transaction([store], 'readwrite');
      for (const row of JSON.parse(rows)) transaction.objectStore(store).put(row);
      transaction.onabort = () => reject(transaction.error);
      transaction.oncomplete = () => {
        opening.result.close();
        resolve();
      };
    };
  });
}
