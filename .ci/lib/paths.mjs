import { join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/[\\/]$/, '');
export const modules = join(root, 'node_modules');
export const cache = join(root, '.cache');
/** Where the finished app stands; the environment may name another place, for a trial. */
export const buildFolder = resolve(root, process.env.LINTFREE_BUILD ?? 'build');
