import { existsSync, readFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { run, runInstalled } from './command.mjs';
import { say } from './say.mjs';

/**
 * @typedef {{ path: string } | { lacking: string }} Browser a program that runs, or the sentence that says what to do
 */

const sentence =
  'Install Chromium (on Debian: apt-get install chromium), or set CHROMIUM to the path of one, and run npm test again.';

/** @param {string} program */
async function starts(program) {
  const { code, output } = await run(program, ['--version'], { limitS: 30 });
  return code === 0 && /chrom/i.test(output);
}

async function playwrightsOwn() {
  const { chromium } = await import('@playwright/test');
  const path = chromium.executablePath();
  return path !== '' && existsSync(path) && (await starts(path)) ? path : null;
}

async function onThePath() {
  const folders = (process.env.PATH ?? '').split(delimiter).filter((each) => each !== '');
  for (const program of ['chromium', 'chromium-browser', 'google-chrome']) {
    const folder = folders.find((each) => existsSync(join(each, program)));
    if (folder !== undefined && (await starts(join(folder, program)))) return join(folder, program);
  }
  return null;
}

function isDebianAsRoot() {
  if (process.getuid?.() !== 0 || !existsSync('/etc/os-release')) return false;
  return /^ID="?debian"?$/m.test(readFileSync('/etc/os-release', 'utf8'));
}

async function fromDebian() {
  if (!isDebianAsRoot()) return null;
  say('Installing Chromium from Debian.');
  const quiet = { env: { DEBIAN_FRONTEND: 'noninteractive' }, limitS: 300 };
  await run('apt-get', ['update', '-qq'], quiet);
  const { code } = await run('apt-get', ['install', '-y', '-qq', 'chromium'], quiet);
  return code === 0 ? onThePath() : null;
}

async function fromPlaywright() {
  say("Installing Playwright's own Chromium.");
  const { code } = await runInstalled(['@playwright/test', 'playwright'], ['install', 'chromium'], { limitS: 300 });
  return code === 0 ? playwrightsOwn() : null;
}

/**
 * A Chromium that starts: the one that was named, one that is there already, else one that is installed now.
 * @returns {Promise<Browser>}
 */
export async function findBrowser() {
  const named = process.env.CHROMIUM;
  if (named) {
    return (await starts(named)) ? { path: named } : { lacking: `CHROMIUM names ${named}, which does not start.` };
  }
  for (const look of [onThePath, playwrightsOwn, fromDebian, fromPlaywright]) {
    const path = await look();
    if (path !== null) return { path };
  }
  return { lacking: sentence };
}
