import { join } from 'node:path';
import { bareAppend } from './lib/bare-append.mjs';
import { openBrowser } from './lib/browser.mjs';
import { fillDatabase } from './lib/fill-database.mjs';
import { importBundled } from './lib/bundle.mjs';
import { median, quantile } from './lib/figures.mjs';
import { shopRecipes } from './lib/shop-recipes.mjs';

export const name = 'from a tap to saved, beside a bare append';

/** Batches of up to 24 that wait for their last inspection, which is done one by one. */
const batches = ['tap-1', 'tap-2', 'tap-3', 'tap-4', 'tap-5', 'tap-6'];
const tapsEach = 20;
/** Of each batch: the page was just made, and its code runs for the first time. */
const warmUp = 4;
const lineLength = 430;

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
 * Taps "pass" on one connector after the other, and after each tap makes a bare append.
 * @param {import('@playwright/test').BrowserContext} browser
 * @param {string} address
 */
async function tapThrough(browser, address) {
  const page = await browser.newPage();
  await page.goto(address);
  await page.locator('button.main').waitFor();
  await page.keyboard.press('Escape');
  await page.evaluate(watchTaps);
  /** @type {{ tap: number, bare: number }[]} */
  const pairs = [];
  const text = 'x'.repeat(lineLength);
  for (let turn = 0; turn < tapsEach; turn += 1) {
    // What is new under the finger takes no tap for 300 ms.
    await page.waitForTimeout(turn === 0 ? 500 : 60);
    const bareFirst = turn % 2 === 0;
    const before = bareFirst ? await page.evaluate(bareAppend, { text }) : 0;
    await page.evaluate(() => new Promise((done) => setTimeout(done, 30)));
    await page.locator('button.main').click();
    const tap = await page.evaluate(() => /** @type {any} */ (globalThis).lastTap());
    await page.evaluate(() => new Promise((done) => setTimeout(done, 30)));
    const bare = bareFirst ? before : await page.evaluate(bareAppend, { text });
    if (turn >= warmUp) pairs.push({ tap, bare });
  }
  await page.close();
  return pairs;
}

/**
 * Runs in the page: notes when a finger comes up on the main button, before the app hears of it, and when the button is
 * at rest again, which it is once the entry is on the disk and the page shows it.
 */
function watchTaps() {
  const kept = /** @type {any} */ (globalThis);
  let begun = 0;
  /** @type {(ms: number) => void} */
  let settle = () => {};
  /** @type {Promise<number>} */
  let tapped = Promise.resolve(0);
  kept.lastTap = () => tapped;
  window.addEventListener(
    'pointerup',
    () => {
      tapped = new Promise((resolve, reject) => {
        settle = resolve;
        setTimeout(() => reject(new Error('the button did not come to rest')), 5000);
      });
      begun = performance.now();
    },
    true,
  );
  new MutationObserver((changes) => {
    const rested = changes.some(({ target, oldValue }) => {
      const button = /** @type {Element} */ (target);
      return oldValue === 'true' && button.matches('button.main[aria-disabled="false"]');
    });
    if (rested) settle(performance.now() - begun);
  }).observe(document.body, { subtree: true, attributeFilter: ['aria-disabled'], attributeOldValue: true });
}

/** @param {readonly { tap: number, bare: number }[][]} rounds */
function rowsOf(rounds) {
  const taps = rounds.flat().length;
  /** @param {number} share @param {string} what @param {number} aim */
  const row = (share, what, aim) => {
    const each = rounds.map((pairs) => {
      const subject = quantile(
        pairs.map(({ tap }) => tap),
        share,
      );
      const floor = quantile(
        pairs.map(({ bare }) => bare),
        share,
      );
      return { subject, floor, ratio: subject / floor };
    });
    return {
      what,
      value: median(each.map(({ subject }) => subject)),
      unit: 'ms',
      floor: median(each.map(({ floor }) => floor)),
      ratio: median(each.map(({ ratio }) => ratio)),
      aim,
      note: `${taps} taps in ${rounds.length} rounds, on the real button`,
    };
  };
  return [row(0.5, 'tap to saved, median', 1.3), row(0.95, 'tap to saved, 95th percentile', 1.5)];
}
