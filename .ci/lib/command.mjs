import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { modules, root } from './paths.mjs';

const onWindows = process.platform === 'win32';
/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set();

/** @param {import('node:child_process').ChildProcess} child */
function stop(child) {
  if (child.pid === undefined) return;
  try {
    // A group of its own lets the grandchildren (browsers, workers) go with it.
    if (onWindows) child.kill();
    else process.kill(-child.pid, 'SIGKILL');
  } catch {
    // It ended in the meantime.
  }
}

process.once('exit', () => running.forEach(stop));
for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.once(signal, () => {
    if (running.size > 0) process.exit(130);
  });
}

/**
 * Runs a program to its end and keeps what it wrote.
 * @param {string} program
 * @param {string[]} args
 * @param {{ env?: Record<string, string>, limitS?: number, shell?: boolean, folder?: string }} [how]
 * @returns {Promise<{ code: number, output: string }>} code 127 where the program is not there, 124 past the limit
 */
export function run(program, args, { env = {}, limitS = 600, shell = false, folder = root } = {}) {
  return new Promise((done) => {
    const surroundings = { ...process.env, NO_COLOR: '1', FORCE_COLOR: undefined, ...env };
    const child = spawn(program, args, { cwd: folder, env: surroundings, shell, detached: !onWindows, stdio: 'pipe' });
    running.add(child);
    child.stdin.end();
    let output = '';
    let late = false;
    const limit = setTimeout(() => {
      late = true;
      stop(child);
    }, limitS * 1000);
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (/** @type {string} */ text) => (output += text));
    }
    /** @param {number} code */
    const end = (code) => {
      clearTimeout(limit);
      running.delete(child);
      done({ code, output });
    };
    child.on('error', (error) => {
      output += error.message;
      end(127);
    });
    child.on('close', (code) => {
      if (late) output += `\nStopped: not done after ${limitS} s.`;
      end(late ? 124 : (code ?? 1));
    });
  });
}

/**
 * The command line of an installed package's program, run by this same Node.
 * @param {string} packageName
 * @param {string} [programName]
 */
export function programOf(packageName, programName = packageName) {
  const folder = join(modules, packageName);
  const { bin } = JSON.parse(readFileSync(join(folder, 'package.json'), 'utf8'));
  return join(folder, typeof bin === 'string' ? bin : bin[programName]);
}

/**
 * Runs an installed package's program with this same Node.
 * @param {[packageName: string, programName?: string]} which
 * @param {string[]} args
 * @param {Parameters<typeof run>[2]} [how]
 */
export function runInstalled([packageName, programName], args, how) {
  return run(process.execPath, [programOf(packageName, programName), ...args], how);
}
