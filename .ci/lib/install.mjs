import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { run } from './command.mjs';
import { modules, root } from './paths.mjs';
import { Refusal, say } from './say.mjs';

/** Stands inside node_modules, so that it goes when they go. */
const stamp = join(modules, '.cache', 'lintfree', 'installed');

/** @param {string} lockText */
function stampOf(lockText) {
  return createHash('sha256').update(`${process.platform} ${process.arch}\n${lockText}`).digest('hex');
}

/**
 * Whether npm's own list of what it installed says the same as the lock. Packages for other machines may be missing.
 * @param {{ packages: Record<string, { version?: string, optional?: boolean }> }} lock
 * @param {{ packages: Record<string, { version?: string }> }} installed
 */
export function agrees(lock, installed) {
  return Object.entries(lock.packages).every(([path, { version, optional }]) => {
    if (path === '') return true;
    const there = installed.packages[path];
    return there === undefined ? optional === true : there.version === version;
  });
}

/** @param {string} lockText */
function isInstalled(lockText) {
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === stampOf(lockText)) return true;
  const list = join(modules, '.package-lock.json');
  return existsSync(list) && agrees(JSON.parse(lockText), JSON.parse(readFileSync(list, 'utf8')));
}

/** npm runs scripts with its own path at hand; without it the shell finds npm. */
function npm() {
  const path = process.env.npm_execpath;
  if (path !== undefined && /npm-cli\.c?js$/.test(path))
    return { program: process.execPath, first: [path], shell: false };
  return { program: 'npm', first: [], shell: process.platform === 'win32' };
}

/** Installs the packages that the lock names, unless they are there. Needs the network only when it installs. */
export async function ensureInstalled() {
  const lockText = readFileSync(join(root, 'package-lock.json'), 'utf8');
  if (!isInstalled(lockText)) {
    say('Installing what is missing; this needs the network once.');
    const { program, first, shell } = npm();
    const args = [...first, 'ci', '--include=dev', '--no-audit', '--no-fund'];
    const { code, output } = await run(program, args, { shell, limitS: 900 });
    if (code !== 0) throw new Refusal(`${output.trim()}\nThe packages could not be installed: is the network there?`);
  }
  mkdirSync(dirname(stamp), { recursive: true });
  writeFileSync(stamp, stampOf(lockText));
}
