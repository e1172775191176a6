import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { buildBarePage } from './lib/bare-page.mjs';
import { usable } from './lib/browser.mjs';
import { bytesOf, loadedFiles } from './lib/loaded-files.mjs';

export const name = 'what a browser loads before the bench can be used, beside a bare page';

const budgetFile = new URL('budget.json', import.meta.url);
/** A count may grow by this share before the run fails. */
const allowance = 0.02;

/** Found by the length of each module before it was made small, when this was written. */
const reason =
  'Above the framework (a third): checks of every stored line 9 kB, all words 8.5 kB, drawings and pages 13 kB, ' +
  'fold, cure and clocks 13 kB, log and bench 14 kB, device 5 kB';

/** @param {import('../../.ci/bench.mjs').Context} context */
export async function run(context) {
  const path = await context.chromium();
  const bareFolder = await buildBarePage(context);
  const appFolder = await context.ensureBuilt();
  const bare = await load(context, path, { folder: bareFolder, ready: 'button', profile: 'bare-profile' });
  const app = await load(context, path, { folder: appFolder, ready: usable, profile: 'app-profile' });
  const floor = bytesOf(bare, ['script', 'style'], true);
  const value = bytesOf(app, ['script', 'style'], true);
  /** @type {Record<string, number>} */
  const counts = {
    'scripts of the first load': bytesOf(app, ['script'], true),
    'styles of the first load': bytesOf(app, ['style'], true),
  };
  const later = bytesOf(app, ['script', 'style'], false);
  const fault = overBudget(counts);
  return [
    {
      what: 'first load, JS and CSS, gzip -9',
      value,
      unit: 'bytes',
      floor,
      ratio: value / floor,
      aim: 3,
      note: `floor: a page with one button. ${reason}`,
      ...(fault === null ? {} : { fault }),
    },
    alone('  of it scripts', counts['scripts of the first load'] ?? 0, bytesOf(bare, ['script'], true)),
    alone('  of it for being in several files', splitCost(appFolder, app), null),
    alone('  of it styles', counts['styles of the first load'] ?? 0, null),
    alone('  fetched once the bench stands', later, null, 'what deciding and the shift need; not counted above'),
    alone('  registers the service worker', bytesOf(app, ['registration'], true), null, 'not counted above'),
    alone('  fonts, already compressed', fontBytes(app, appFolder), null, 'as stored; not counted above'),
    alone('  recipes, gzip -9', recipeBytes(context.root), null, 'read where a batch is begun; not counted above'),
  ];
}

/**
 * @param {import('../../.ci/bench.mjs').Context} context
 * @param {string} path
 * @param {{ folder: string, ready: string, profile: string }} what
 */
async function load(context, path, { folder, ready, profile }) {
  const serving = await context.serve({ folder, port: 0 });
  try {
    return await loadedFiles({ path, profile: join(context.folder, profile), address: serving.address, folder, ready });
  } finally {
    await serving.close();
  }
}

/**
 * What the scripts of the first load would save as one file. They stay apart, so that an update fetches only what changed.
 * @param {string} folder
 * @param {readonly import('./lib/loaded-files.mjs').LoadedFile[]} files
 */
function splitCost(folder, files) {
  const early = files.filter((file) => file.early && file.kind === 'script');
  const joined = Buffer.concat(early.map(({ path }) => readFileSync(join(folder, path))));
  return bytesOf(early, ['script'], true) - gzipSync(joined, { level: 9 }).length;
}

/** @param {string} what @param {number} value @param {number | null} floor @param {string} [note] */
function alone(what, value, floor, note) {
  const ratio = floor === null || floor === 0 ? null : value / floor;
  return { what, value, unit: 'bytes', floor, ratio, aim: null, ...(note === undefined ? {} : { note }) };
}

/** @param {readonly import('./lib/loaded-files.mjs').LoadedFile[]} files @param {string} folder */
function fontBytes(files, folder) {
  const fonts = files.filter(({ kind }) => kind === 'font');
  return fonts.reduce((sum, { path }) => sum + readFileSync(join(folder, path)).length, 0);
}

/** @param {string} root */
function recipeBytes(root) {
  const folder = join(root, 'recipes');
  return readdirSync(folder)
    .map((file) => gzipSync(readFileSync(join(folder, file)), { level: 9 }).length)
    .reduce((sum, bytes) => sum + bytes, 0);
}

/**
 * The sentence for counts that grew past their budget, or null. Without a budget, these counts become it: to set a new
 * one, take the file away and measure.
 * @param {Record<string, number>} counts
 */
function overBudget(counts) {
  if (!existsSync(budgetFile)) {
    writeFileSync(budgetFile, `${JSON.stringify(counts, null, 2)}\n`);
    return null;
  }
  /** @type {Record<string, number>} */
  const budget = JSON.parse(readFileSync(budgetFile, 'utf8'));
  const grown = Object.entries(counts).filter(([what, bytes]) => bytes > (budget[what] ?? 0) * (1 + allowance));
  if (grown.length === 0) return null;
  const told = grown.map(([what, bytes]) => `${what}: ${bytes} bytes, budget ${budget[what] ?? 0}`);
  return `More than ${allowance * 100} % over test/bench/budget.json: ${told.join('; ')}.`;
}
