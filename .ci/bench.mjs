import { mkdirSync, mkdtempSync, readdirSync, existsSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { refuseOldNode } from './lib/node-version.mjs';
import { Refusal, main, say } from './lib/say.mjs';

/**
 * What a suite in test/bench/ is given. It exports `name` and `async run(context)`, which returns rows.
 * @typedef {object} Context
 * @property {string} root of the checkout
 * @property {string} folder an empty one, taken away afterwards
 * @property {() => Promise<string>} ensureBuilt builds the app if it changed; the folder it stands in
 * @property {typeof import('./lib/serve.mjs').serve} serve
 * @property {() => Promise<string>} chromium path of a Chromium that starts
 * @property {typeof import('./lib/import-typescript.mjs').importTypescript} importTypescript
 * @property {typeof import('./lib/command.mjs').runInstalled} runInstalled
 * @property {(sentence: string) => void} say
 */

/** @param {string} folder @returns {Promise<Context>} */
async function contextIn(folder) {
  const { root, buildFolder } = await import('./lib/paths.mjs');
  const { ensureBuilt } = await import('./lib/build.mjs');
  const { serve } = await import('./lib/serve.mjs');
  const { findBrowser } = await import('./lib/browser.mjs');
  const { importTypescript } = await import('./lib/import-typescript.mjs');
  const { runInstalled } = await import('./lib/command.mjs');
  return {
    root,
    folder,
    ensureBuilt: () => ensureBuilt().then(() => buildFolder),
    serve,
    chromium: async () => {
      const browser = await findBrowser();
      if ('lacking' in browser) throw new Refusal(browser.lacking);
      return browser.path;
    },
    importTypescript,
    runInstalled,
    say,
  };
}

await main(async () => {
  refuseOldNode();
  const { ensureInstalled } = await import('./lib/install.mjs');
  await ensureInstalled();
  const { cache, root } = await import('./lib/paths.mjs');
  const { misses, table } = await import('./lib/bench-table.mjs');
  const suites = join(root, 'test', 'bench');
  const wanted = process.argv.slice(2);
  const files = (existsSync(suites) ? readdirSync(suites) : [])
    .filter(
      (each) => each.endsWith('.bench.mjs') && (wanted.length === 0 || wanted.some((word) => each.includes(word))),
    )
    .sort();
  if (files.length === 0)
    throw new Refusal('There is nothing to measure: no file in test/bench/ that fits ends in .bench.mjs.');

  /** @type {import('./lib/bench-table.mjs').Row[]} */
  const rows = [];
  for (const file of files) {
    const folder = mkdtempSync(join(tmpdir(), 'lintfree-bench-'));
    try {
      const suite = await import(pathToFileURL(join(suites, file)).href);
      say(`Measuring ${suite.name}.`);
      rows.push(...(await suite.run(await contextIn(folder))));
    } finally {
      rmSync(folder, { recursive: true, force: true });
    }
  }
  mkdirSync(cache, { recursive: true });
  writeFileSync(join(cache, 'bench.json'), `${JSON.stringify(rows, null, 2)}\n`);
  say(`\n${table(rows)}\n`);
  const missed = rows.filter(misses).length;
  say(
    missed === 0
      ? 'Every aim is met.'
      : `${missed} of ${rows.filter((row) => row.aim !== null).length} aims are missed.`,
  );
  const faults = rows.flatMap(({ fault }) => fault ?? []);
  faults.forEach(say);
  return faults.length === 0 ? 0 : 1;
});
