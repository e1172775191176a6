import { join } from 'node:path';
import { noteUsable, openBrowser, usable, usableAtMs } from './lib/browser.mjs';
import { importBundled } from './lib/bundle.mjs';
import { byTurns, ratioOf, spread } from './lib/figures.mjs';
import { fillDatabase } from './lib/fill-database.mjs';
import { shopRecipes } from './lib/shop-recipes.mjs';

export const name = 'opening the app on a long log, beside a short one';

const sizes = { long: 200_000, short: 1000 };
const rounds = 7;

/** @param {import('../../.ci/bench.mjs').Context} context */
export async function run(context) {
  const path = await context.chromium();
  const folder = await context.ensureBuilt();
  const serving = await context.serve({ folder, port: 0 });
  const profiles = { long: join(context.folder, 'long'), short: join(context.folder, 'short') };
  try {
    const filled = { long: 0, short: 0 };
    for (const size of /** @type {const} */ (['short', 'long'])) {
      const log = await logOf(context, sizes[size]);
      const browser = await openBrowser({ path, profile: profiles[size] });
      try {
        filled[size] = (await fillDatabase(browser, serving.address, log)).rebuildMs;
      } finally {
        await browser.close();
      }
    }
    // The database tidies what was just written when it is opened for the first time after.
    for (const profile of Object.values(profiles)) await openedMs({ path, profile, address: serving.address });
    const pairs = await byTurns({
      rounds,
      subject: () => openedMs({ path, profile: profiles.long, address: serving.address }),
      floor: () => openedMs({ path, profile: profiles.short, address: serving.address }),
    });
    return [
      {
        what: 'opening with 200,000 entries of closed batches',
        unit: 'ms',
        ...ratioOf(pairs),
        aim: 1.2,
        note: `floor: 1,000; both with 3 open batches, each time in a browser just started; ${spread(pairs)}`,
      },
      {
        what: 'the first opening after the fold changed',
        value: filled.long,
        unit: 'ms',
        floor: filled.short,
        ratio: filled.long / filled.short,
        aim: null,
        note: 'reads the whole log once and makes every derived row anew',
      },
    ];
  } finally {
    await serving.close();
  }
}

/**
 * @param {import('../../.ci/bench.mjs').Context} context
 * @param {number} entries
 */
async function logOf(context, entries) {
  const { shopLog } = /** @type {typeof import('./lib/fold-work.ts')} */ (
    await importBundled(context, 'test/bench/lib/fold-work.ts')
  );
  return shopLog({
    recipeTexts: shopRecipes(context.root),
    entries,
    open: [
      { id: 'open-1', until: 'cure' },
      { id: 'open-2', until: 'inspect' },
      { id: 'open-3', until: 'inspect' },
    ],
    endWallMs: Date.now() - 60_000,
    seed: 3,
  });
}

/**
 * From the start of the navigation until the bench can be used, on the page's own clock.
 * @param {{ path: string, profile: string, address: string }} what
 */
async function openedMs({ path, profile, address }) {
  const browser = await openBrowser({ path, profile });
  try {
    const page = await browser.newPage();
    await page.addInitScript(noteUsable, usable);
    await page.goto(`${address}/`);
    const at = await page.waitForFunction(usableAtMs, null, { timeout: 60_000 });
    return /** @type {number} */ (await at.jsonValue());
  } finally {
    await browser.close();
  }
}
