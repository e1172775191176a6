import { createHash } from 'node:crypto';
import * as fs from 'node:fs';
import { join } from 'node:path';
import { runInstalled } from './command.mjs';
import { buildFolder, cache, root } from './paths.mjs';
import { Refusal, say } from './say.mjs';

/** Everything that a build is made of. A file that is missing here would let an old build pass for a new one. */
const sources = [
  'src',
  'static',
  'recipes',
  'package.json',
  'package-lock.json',
  'svelte.config.js',
  'tsconfig.json',
  'vite.config.ts',
  '.ci/lib/build.mjs',
];
/** The name of the file inside a build that says what it was built from. */
const stampName = '.lintfree-build';

/**
 * Paths of all files under a path, sorted, so that two machines reckon the same hash.
 * @param {string} from
 * @param {string} path relative to `from`
 * @returns {string[]}
 */
function filesUnder(from, path) {
  if (!fs.existsSync(join(from, path))) return [];
  if (!fs.statSync(join(from, path)).isDirectory()) return [path];
  return fs
    .readdirSync(join(from, path))
    .sort()
    .flatMap((name) => filesUnder(from, `${path}/${name}`));
}

/**
 * The version of what stands in the checkout: 16 hex digits of the hash of every source, names included.
 * @param {string} [base] path under which the app will stand
 * @param {string} [checkout]
 */
export function versionOfSources(base = '', checkout = root) {
  const hash = createHash('sha256').update(`base ${base}\n`);
  for (const path of sources.flatMap((each) => filesUnder(checkout, each))) {
    const content = fs.readFileSync(join(checkout, path));
    hash.update(`${path} ${content.length}\n`).update(content);
  }
  return hash.digest('hex').slice(0, 16);
}

/**
 * Builds the app into a folder of the caller's choice, under a version of the caller's choice.
 * @param {{ folder: string, version: string, base?: string }} what
 */
export async function buildInto({ folder, version, base = '' }) {
  fs.mkdirSync(cache, { recursive: true });
  const workshop = fs.mkdtempSync(join(cache, 'kit-'));
  try {
    const sync = await runInstalled(['@sveltejs/kit', 'svelte-kit'], ['sync'], { limitS: 120 });
    if (sync.code !== 0) throw new Refusal(`${sync.output.trim()}\nThe build failed.`);
    const { code, output } = await runInstalled(['vite'], ['build', '--logLevel', 'warn'], {
      limitS: 300,
      env: {
        NODE_ENV: 'production',
        VITEST: '',
        LINTFREE_VERSION: version,
        LINTFREE_BASE: base,
        LINTFREE_OUT: folder,
        LINTFREE_KIT: workshop,
      },
    });
    if (code !== 0) throw new Refusal(`${output.trim()}\nThe build failed.`);
    if (!fs.existsSync(join(folder, 'index.html')))
      throw new Refusal(`${output.trim()}\nThe build made no index.html.`);
    fs.writeFileSync(join(folder, stampName), version);
    return output;
  } finally {
    fs.rmSync(workshop, { recursive: true, force: true });
  }
}

/** @param {string} version */
function stands(version) {
  const stamp = join(buildFolder, stampName);
  return (
    fs.existsSync(stamp) && fs.readFileSync(stamp, 'utf8') === version && fs.existsSync(join(buildFolder, 'index.html'))
  );
}

/**
 * Puts a finished build in the place of the old one: two renames, so that no half-written build is ever served.
 * @param {string} fresh
 */
function swap(fresh) {
  const old = `${fresh}-old`;
  const had = fs.existsSync(buildFolder);
  if (had) fs.renameSync(buildFolder, old);
  try {
    fs.renameSync(fresh, buildFolder);
  } catch (error) {
    if (had) fs.renameSync(old, buildFolder);
    throw error;
  }
  fs.rmSync(old, { recursive: true, force: true });
}

/** What a build that was killed left behind. An hour is longer than any build takes. */
function sweep() {
  if (!fs.existsSync(cache)) return;
  for (const name of fs.readdirSync(cache).filter((each) => /^(kit|build)-/.test(each))) {
    const path = join(cache, name);
    if (Date.now() - fs.statSync(path).mtimeMs > 3_600_000) fs.rmSync(path, { recursive: true, force: true });
  }
}

/**
 * Builds if what stands in the checkout is not what was built. A build that fails leaves the old one as it was.
 * @param {{ base?: string, quiet?: boolean }} [how]
 * @returns {Promise<{ version: string, built: boolean }>}
 */
export async function ensureBuilt({ base = '', quiet = false } = {}) {
  const version = versionOfSources(base);
  if (stands(version)) return { version, built: false };
  if (!quiet) say('Building.');
  sweep();
  fs.mkdirSync(cache, { recursive: true });
  const fresh = fs.mkdtempSync(join(cache, 'build-'));
  try {
    await buildInto({ folder: fresh, version, base });
    swap(fresh);
  } finally {
    fs.rmSync(fresh, { recursive: true, force: true });
  }
  return { version, built: true };
}
