import { join } from 'node:path';
import { bareAppend } from './lib/bare-append.mjs';
import { openBrowser } from './lib/browser.mjs';
import { fillDatabase } from './lib/fill-database.mjs';
import { importBundled } from './lib/bundle.mjs';
import { quantile, ratioOf } from './lib/figures.mjs';
import { shopRecipes } from './lib/shop-recipes.mjs';

export const name = 'from a tap to saved, beside a bare append';

/** Batches of up to 24 that wait for their last inspection, which is done one by one. */
const batches = ['tap-1', 'tap-2', 'tap-3', 'tap-4', 'tap-5', 'tap-6'];
const tapsEach = 20;
/** At first the page was just made, and its code runs for the first time. */
const warmUp = 4;
const lineLength = 430;

const reason =
  "A flush costs next to nothing on this kind of disk, so the floor is almost only the browser's own two trips; on a " +
  'tablet whose flush takes 10 ms and more, the same work is a small part';

/** @param {import('../../.ci/bench.mjs').Context} context */
export async function run(context) {
  const path = await context.chromium();
  const folder = await context.ensureBuilt();
  const { shopLog } = /** @type {typeof import('./lib/fold-work.ts')} */ (
    await importBundled(context, 'test/bench/lib/fold-work.ts')
  );
  const log = shopLog({
    recipeTexts: shopRecipes(context.root),
    entries: 1000,
    open: batches.map((id) => ({ id, until: 'inspect' })),
    endWallMs: Date.now() - 60_000,
    seed: 2,
  });
  const serving = await context.serve({ folder, port: 0 });
  const browser = await openBrowser({ path, profile: join(context.folder, 'profile') });
  try {
    await fillDatabase(browser, serving.address, log);
    const rounds = [];
    for (const batch of batches) rounds.push(await tapThrough(browser, `${serving.address}/#/batch/batch-${batch}`));
    return rowsOf(rounds);
  } finally {
    await browser.close();
    await serving.close();
  }
}

/**
 * Taps "pass" on one connector after the other, and makes a bare append before or after each tap.
 * @typedef {{ asked: number, onDisk: number, shown: number, bare: number }} Pair ms since the finger came up
 * @param {import('@playwright/test').BrowserContext} browser
 * @param {string} address
 */
async function tapThrough(browser, address) {
  const page = await browser.newPage();
  await page.addInitScript(watchTaps);
  await page.goto(address);
  await page.locator('button.main').waitFor();
  // After a restart the page first says where one was.
  await page.keyboard.press('Escape');
  // What is new under the finger takes no tap for 300 ms.
  await page.waitForTimeout(1000);
  const pause = () => page.waitForTimeout(40);
  const bare = () => page.evaluate(bareAppend, { text: 'x'.repeat(lineLength) });
  const tap = async () => {
    await page.locator('button.main').click();
    return page.evaluate(() => /** @type {any} */ (globalThis).lastTap());
  };
  /** @type {Pair[]} */
  const pairs = [];
  for (let turn = 0; turn < tapsEach; turn += 1) {
    await pause();
    const first = turn % 2 === 0 ? await bare() : null;
    await pause();
    const parts = await tap();
    await pause();
    const floor = first ?? (await bare());
    if (turn >= warmUp) pairs.push({ ...parts, bare: floor });
  }
  await page.close();
  return pairs;
}

/**
 * Runs in the page, before its own code: notes when a finger comes up, before the app hears of it; when the app asks the
 * store to write; when the entry is on the disk; and when the button is at rest again, which says that it is saved.
 */
function watchTaps() {
  /** @type {Partial<Record<'up' | 'asked' | 'onDisk', number>>} */
  let at = {};
  /** @type {(parts: object) => void} */
  let settle = () => {};
  /** @type {Promise<object>} */
  let tapped = Promise.resolve({});
  /** @type {any} */ (globalThis).lastTap = () => tapped;
  window.addEventListener(
    'pointerup',
    () => {
      at = { up: performance.now() };
      tapped = new Promise((resolve, reject) => {
        settle = resolve;
        setTimeout(() => reject(new Error('the button did not come to rest')), 5000);
      });
    },
    true,
  );
  const begin = IDBDatabase.prototype.transaction;
  IDBDatabase.prototype.transaction = function (...asked) {
    const transaction = begin.apply(this, asked);
    if (this.name === 'lintfree' && asked[1] === 'readwrite') {
      at.asked = performance.now();
      transaction.addEventListener('complete', () => (at.onDisk = performance.now()));
    }
    return transaction;
  };
  new MutationObserver((changes) => {
    const rested = changes.some(({ target, oldValue }) => {
      const button = /** @type {Element} */ (target);
      return oldValue === 'true' && button.matches('button.main[aria-disabled="false"]');
    });
    const { up = NaN, asked = NaN, onDisk = NaN } = at;
    if (rested) settle({ asked: asked - up, onDisk: onDisk - up, shown: performance.now() - up });
  }).observe(document, { subtree: true, attributeFilter: ['aria-disabled'], attributeOldValue: true });
}

/** @param {readonly (readonly Pair[])[]} rounds */
function rowsOf(rounds) {
  const note = `${rounds.flat().length} taps in ${rounds.length} rounds, on the real button`;
  /**
   * @param {string} what @param {number} share @param {'asked' | 'onDisk' | 'shown'} part
   * @param {number | null} aim @param {string} told
   */
  const row = (what, share, part, aim, told) => {
    const each = rounds.map((pairs) => {
      const subject = quantile(
        pairs.map((pair) => pair[part]),
        share,
      );
      return {
        subject,
        floor: quantile(
          pairs.map(({ bare }) => bare),
          share,
        ),
      };
    });
    return { what, unit: 'ms', ...ratioOf(each), aim, note: told };
  };
  return [
    row('tap to saved, median', 0.5, 'shown', 1.3, `${note}. ${reason}`),
    row('tap to saved, 95th percentile', 0.95, 'shown', 1.5, 'the same taps'),
    row('  of it until the store is asked', 0.5, 'asked', null, 'decides, folds twice, makes and reads the line'),
    row('  of it until it is on the disk', 0.5, 'onDisk', null, 'one line with its index, head and register'),
  ];
}
