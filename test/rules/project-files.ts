import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = fileURLToPath(new URL('../..', import.meta.url));

/** What is made and not written: the same list as in .gitignore. */
const folders = new Set(['.git', 'node_modules', 'build', '.cache', 'test-results']);
const made = { has: (name: string) => folders.has(name) || name.startsWith('.svelte-kit') };

/** Paths of all written files under a folder, from the root of the checkout, with forward slashes. */
export function filesUnder(folder: string): string[] {
  return readdirSync(join(root, folder), { withFileTypes: true })
    .filter((each) => !made.has(each.name) && !each.name.endsWith('.tsbuildinfo'))
    .flatMap((each) => {
      const path = folder === '' ? each.name : `${folder}/${each.name}`;
      return each.isDirectory() ? filesUnder(path) : [path];
    })
    .sort();
}

/** Names at the top level, folders marked by a slash. */
export function topLevel(): string[] {
  return readdirSync(root, { withFileTypes: true })
    .filter((each) => !made.has(each.name))
    .map((each) => (each.isDirectory() ? `${each.name}/` : each.name))
    .sort();
}

export function read(path: string): string {
  return readFileSync(join(root, path), 'utf8');
}
