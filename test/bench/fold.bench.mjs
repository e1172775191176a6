import { performance } from 'node:perf_hooks';
import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { importBundled } from './lib/bundle.mjs';
import { ratioOf, spread } from './lib/figures.mjs';
import { shopRecipes } from './lib/shop-recipes.mjs';

export const name = 'the fold beside JSON.parse of the same lines';

const entryCount = 100_000;
const rounds = 9;
const warmUp = 2;
const reason = 'Half of either is the clearing away of garbage, which shows most where others use the machine';

/** Garbage of one is not cleared away in the time of the other. */
setFlagsFromString('--expose-gc');
const clearAway = /** @type {() => void} */ (runInNewContext('gc'));

/**
 * @template Made
 * @param {() => Made} work
 * @returns {{ ms: number, made: Made }}
 */
function timed(work) {
  clearAway();
  const begun = performance.now();
  const made = work();
  return { ms: performance.now() - begun, made };
}

/** @param {import('../../.ci/bench.mjs').Context} context */
export async function run(context) {
  const work = /** @type {typeof import('./lib/fold-work.ts')} */ (
    await importBundled(context, 'test/bench/lib/fold-work.ts')
  );
  const { lines } = work.shopLog({
    recipeTexts: shopRecipes(context.root),
    entries: entryCount,
    open: [],
    endWallMs: Date.UTC(2026, 5, 1),
    seed: 1,
  });
  const texts = lines.map(({ text }) => text);
  const batches = new Set(lines.map(({ batch }) => batch)).size - 1;
  work.checkFold(work.fold(work.parseWithCheck(texts)), batches);

  const folded = [];
  const checked = [];
  for (let round = -warmUp; round < rounds; round += 1) {
    const floor = timed(() => work.parseOnly(texts));
    // Entries just parsed, as a start has them: nothing about their texts is remembered yet.
    const fold = timed(() => work.fold(floor.made));
    if (round >= 0) folded.push({ subject: fold.ms, floor: floor.ms });
    if (round % 3 === 0) checked.push({ subject: timed(() => work.parseWithCheck(texts)).ms, floor: floor.ms });
  }
  const count = texts.length.toLocaleString('en');
  return [
    {
      what: `folding ${count} entries of ${batches} batches`,
      unit: 'ms',
      ...ratioOf(folded),
      aim: 1,
      note: `floor: JSON.parse of the same lines; ${spread(folded)}. ${reason}`,
    },
    {
      what: `reading ${count} lines with every check`,
      unit: 'ms',
      ...ratioOf(checked),
      aim: null,
      note: `the same floor; ${spread(checked)}. A start reads only the lines of open batches`,
    },
  ];
}
