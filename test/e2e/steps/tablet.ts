import { chromium, type BrowserContext, type Page } from '@playwright/test';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { execFileSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import config from '../../../.ci/playwright.config.js';
import { installClock } from './page-clock.ts';

export const build = process.env.LINTFREE_BUILD ?? fileURLToPath(new URL('../../../build', import.meta.url));

export interface Tablet {
  readonly context: BrowserContext;
  readonly page: Page;
}

/** Switches a tablet on: Chromium on a profile on the disk, its page clock at a wall time. */
export async function switchOn(profile: string, address: string, wallMs: number): Promise<Tablet> {
  const context = await chromium.launchPersistentContext(profile, {
    ...config.use?.launchOptions,
    baseURL: address,
    viewport: { width: 1280, height: 800 },
    hasTouch: true,
    timezoneId: 'UTC',
  });
  context.setDefaultTimeout(15_000);
  await installClock(context, wallMs);
  const page = context.pages()[0] ?? (await context.newPage());
  await page.goto('/');
  await page.getByRole('button').first().waitFor();
  return { context, page };
}

/** The power goes: SIGKILL for the browser's own process, found by the profile that is its alone. */
export async function cutPower({ context }: Tablet, profile: string): Promise<void> {
  const gone = new Promise((resolve) => context.once('close', resolve));
  const pids = browserProcesses(profile);
  if (pids.length !== 1) throw new Error(`${pids.length} browsers on ${profile}`);
  for (const pid of pids) process.kill(pid, 'SIGKILL');
  await gone;
}

/** Children of a browser carry a type; the browser itself does not. */
function browserProcesses(profile: string): number[] {
  return commandLines()
    .filter(({ words }) => words.includes(`--user-data-dir=${profile}`) && !words.includes('--type='))
    .map(({ pid }) => pid);
}

function commandLines(): { pid: number; words: string }[] {
  if (!existsSync('/proc/self/cmdline')) {
    return execFileSync('ps', ['-axo', 'pid=,args='], { encoding: 'utf8' })
      .split('\n')
      .map((line) => ({ pid: Number.parseInt(line, 10), words: line }));
  }
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name))
    .flatMap((name) => {
      try {
        return { pid: Number(name), words: readFileSync(`/proc/${name}/cmdline`, 'utf8').replaceAll('\0', ' ') };
      } catch {
        // It ended meanwhile.
        return [];
      }
    });
}
