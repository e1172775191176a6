import { execFileSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { bundle, importBundled } from './lib/bundle.mjs';
import { ratioOf, spread } from './lib/figures.mjs';
import { shopRecipes } from './lib/shop-recipes.mjs';

export const name = 'the fold beside JSON.parse of the same lines';

/** @param {import('../../.ci/bench.mjs').Context} context */
export async function run(context) {
  const path = 'test/bench/lib/fold-work.ts';
  const { shopLog } = /** @type {typeof import('./lib/fold-work.ts')} */ (await importBundled(context, path));
  const { lines } = shopLog({
    recipeTexts: shopRecipes(context.root),
    entries: 100_000,
    open: [],
    endWallMs: Date.UTC(2026, 5, 1),
    seed: 1,
  });
  const file = join(context.folder, 'lines.txt');
  writeFileSync(file, lines.map(({ text }) => `${text}\n`).join(''));
  const measuring = fileURLToPath(new URL('lib/fold-run.mjs', import.meta.url));
  const told = execFileSync(process.execPath, ['--expose-gc', measuring, await bundle(context, path), file]);
  const { entries, batches, folded, checked } = JSON.parse(told.toString());
  const count = entries.toLocaleString('en');
  return [
    {
      what: `folding ${count} entries of ${batches} batches`,
      unit: 'ms',
      ...ratioOf(folded),
      aim: 1,
      note: `floor: JSON.parse of the same lines; ${spread(folded)}; processor time, half of it clears away garbage`,
    },
    {
      what: `reading ${count} lines with every check`,
      unit: 'ms',
      ...ratioOf(checked),
      aim: null,
      note: `the same floor; ${spread(checked)}; a start reads only the lines of open batches`,
    },
  ];
}
