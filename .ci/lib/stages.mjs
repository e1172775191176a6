import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { findBrowser } from './browser.mjs';
import { ensureBuilt } from './build.mjs';
import { runInstalled } from './command.mjs';
import { readPlaywright, readVitest } from './counts.mjs';
import { buildFolder, cache } from './paths.mjs';

/** @typedef {import('./schedule.mjs').Stage} Stage */

const passed = { passed: 1, failed: 0, skipped: 0 };

/**
 * A stage that is one check: it passes or it does not.
 * @param {string} name
 * @param {[packageName: string, programName?: string]} program
 * @param {string[]} args
 * @param {Pick<Stage, 'after' | 'needs'>} [order]
 * @returns {Stage}
 */
function check(name, program, args, order = { needs: ['sync'] }) {
  const run = async () => {
    const { code, output } = await runInstalled(program, args, { limitS: 400 });
    return code === 0 ? { ...passed, output } : { passed: 0, failed: 1, skipped: 0, output };
  };
  return { name, run, ...order };
}

/**
 * Where a test runner leaves its report; what an earlier run left is taken away first.
 * @param {string} name
 */
function freshReport(name) {
  mkdirSync(cache, { recursive: true });
  const file = join(cache, `${name}-${process.pid}.json`);
  rmSync(file, { force: true });
  return file;
}

/**
 * Vitest tells each file first and the failures after them; the files that passed are of no use here.
 * @param {string} output
 */
function failuresIn(output) {
  const start = output.search(/^⎯+ (Failed (Suites|Tests)|Unhandled Errors)/m);
  return start < 0 ? output : output.slice(start);
}

/** @type {Stage} */
const vitest = {
  name: 'tests',
  needs: ['sync'],
  run: async () => {
    const file = freshReport('vitest');
    const args = ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${file}`];
    const { code, output } = await runInstalled(['vitest'], args, { limitS: 420 });
    const counts = readVitest(file, code);
    rmSync(file, { force: true });
    return { ...counts, output: failuresIn(output) };
  },
};

/** @type {Stage} */
const build = { name: 'build', needs: ['sync'], run: () => ensureBuilt({ quiet: true }).then(() => passed) };

/** @param {string} chromium */
async function runBrowserTests(chromium) {
  const { serve } = await import('./serve.mjs');
  const serving = await serve({ folder: buildFolder, port: 0 });
  const file = freshReport('playwright');
  try {
    const args = ['test', '--config', '.ci/playwright.config.js', '--reporter=list,json'];
    const { code, output } = await runInstalled(['@playwright/test', 'playwright'], args, {
      limitS: 540,
      env: {
        CHROMIUM: chromium,
        LINTFREE_ADDRESS: serving.address,
        LINTFREE_BUILD: buildFolder,
        PLAYWRIGHT_JSON_OUTPUT_FILE: file,
      },
    });
    return { ...readPlaywright(file, code), output };
  } finally {
    rmSync(file, { force: true });
    await serving.close();
  }
}

/** What needs neither a browser nor a build. Prettier needs no synced types, so it starts at once. */
const fast = [
  check('sync', ['@sveltejs/kit', 'svelte-kit'], ['sync'], {}),
  check('format', ['prettier'], ['--check', '.'], {}),
  vitest,
  check('lint', ['eslint'], ['--config', '.ci/eslint.config.js', '--max-warnings', '0', '.']),
  check('types', ['svelte-check'], ['--tsconfig', './tsconfig.json', '--fail-on-warnings', '--output', 'human']),
  check('types of core', ['typescript', 'tsc'], ['-p', '.ci/tsconfig.core.json']),
  check('types of the service worker', ['typescript', 'tsc'], ['-p', '.ci/tsconfig.worker.json']),
  check('types of the tools', ['typescript', 'tsc'], ['-p', '.ci/tsconfig.tools.json']),
];

/**
 * @param {{ fast: boolean }} which
 * @returns {Stage[]}
 */
export function stagesOf(which) {
  if (which.fast) return fast;
  let chromium = '';
  /** @type {Stage} */
  const look = {
    name: 'browser',
    run: async () => {
      const browser = await findBrowser();
      if ('lacking' in browser) throw new Error(browser.lacking);
      chromium = browser.path;
      return { passed: 0, failed: 0, skipped: 0 };
    },
  };
  /** Alone, after all the others: what it measures in time should not be shared. @type {Stage} */
  const browserTests = {
    name: 'browser tests',
    after: fast.map((each) => each.name),
    needs: ['browser', 'build'],
    run: () => runBrowserTests(chromium),
  };
  return [look, ...fast, build, browserTests];
}
