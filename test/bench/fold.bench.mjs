import { performance } from 'node:perf_hooks';
import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { importBundled } from './lib/bundle.mjs';
import { byTurns, ratioOf, spread } from './lib/figures.mjs';
import { shopRecipes } from './lib/shop-recipes.mjs';

export const name = 'the fold beside JSON.parse of the same lines';

const entryCount = 100_000;
const rounds = 11;

/** Garbage of one is not cleared away in the time of the other. */
setFlagsFromString('--expose-gc');
const clearAway = /** @type {() => void} */ (runInNewContext('gc'));

/** @param {() => unknown} work */
function timeMs(work) {
  clearAway();
  const begun = performance.now();
  const made = work();
  const ms = performance.now() - begun;
  if (made === undefined) throw new Error('nothing was made');
  return ms;
}

/** @param {import('../../.ci/bench.mjs').Context} context */
export async function run(context) {
  const work = /** @type {typeof import('./lib/fold-work.ts')} */ (
    await importBundled(context, 'test/bench/lib/fold-work.ts')
  );
  const log = work.shopLog({
    recipeTexts: shopRecipes(context.root),
    entries: entryCount,
    open: [],
    endWallMs: Date.UTC(2026, 5, 1),
    seed: 1,
  });
  const texts = log.lines.slice(-entryCount).map(({ text }) => text);
  // The recipes are the first lines of the log, which a cut at the front would lose.
  const all = log.lines.map(({ text }) => text);
  const entries = work.parseWithCheck(all);
  const batches = new Set(entries.map(({ batch }) => batch)).size - 1;
  work.checkFold(work.fold(entries), batches);

  const floor = () => timeMs(() => work.parseOnly(all));
  for (let warm = 0; warm < 2; warm += 1) {
    floor();
    timeMs(() => work.fold(entries));
  }
  const folded = await byTurns({ rounds, subject: () => timeMs(() => work.fold(entries)), floor });
  const checked = await byTurns({ rounds: 5, subject: () => timeMs(() => work.parseWithCheck(all)), floor });
  const count = entries.length.toLocaleString('en');
  void texts;
  return [
    {
      what: `folding ${count} entries, ${batches} batches`,
      unit: 'ms',
      ...ratioOf(folded),
      aim: 1,
      note: `floor: JSON.parse; ${spread(folded)}`,
    },
    {
      what: `reading ${count} lines with every check`,
      unit: 'ms',
      ...ratioOf(checked),
      aim: null,
      note: `floor: JSON.parse; ${spread(checked)}; a start reads only the lines of open batches`,
    },
  ];
}
