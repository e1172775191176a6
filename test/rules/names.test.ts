import { describe, expect, test } from 'vitest';
import { filesUnder, read, topLevel } from './project-files.ts';

const topLevelNames = [
  'DEVELOPERS.md',
  'LICENSE',
  'README.md',
  'package-lock.json',
  'package.json',
  'recipes/',
  'src/',
  'static/',
  'svelte.config.js',
  'test/',
  'tsconfig.json',
  'vite.config.ts',
];

const isKebab = (name: string) => /^[a-z0-9]+(-[a-z0-9]+)*$/.test(name);

/** What is wrong with a path's names, or null. SvelteKit's own files begin with a plus, its parameters stand in brackets. */
function nameProblem(path: string): string | null {
  const parts = path.split('/').slice(1);
  const file = parts.at(-1) ?? '';
  const folders = parts
    .slice(0, -1)
    .map((name) => (path.startsWith('src/routes/') ? name.replace(/^[[(]|[\])]$/g, '') : name));
  const bad = [...folders, ...file.replace(/^\+/, path.startsWith('src/routes/') ? '' : '+').split('.')].find(
    (name) => !isKebab(name),
  );
  return bad === undefined ? null : `${path}: "${bad}" is not in lower case with hyphens`;
}

const longestFile = 300;
const lineCount = (text: string) => text.replace(/\n$/, '').split('\n').length;

describe('names and sizes', () => {
  test('the top level holds nothing but what it must', () => {
    expect(topLevel().filter((name) => !name.startsWith('.') && !topLevelNames.includes(name))).toEqual([]);
    expect(topLevelNames.filter((name) => !topLevel().includes(name))).toEqual([]);
  });

  test('files and folders are in lower case with hyphens', () => {
    const paths = ['src', 'test', 'recipes', 'static', '.ci'].flatMap(filesUnder);
    expect(paths.length).toBeGreaterThan(80);
    expect(paths.map(nameProblem).filter((each) => each !== null)).toEqual([]);
  });

  test.each(['src/ui/FibreLine.svelte', 'src/core/Unit/a.ts', 'src/ui/fibre_line.ts', 'src/ui/+page.svelte'])(
    'a bad name is found: %s',
    (path) => expect(nameProblem(path)).not.toBeNull(),
  );

  test.each([
    'src/routes/+page.svelte',
    'src/routes/batch/[id]/+page.ts',
    'src/bench/bench.svelte.ts',
    'static/icon-192.png',
  ])('a good name is let through: %s', (path) => expect(nameProblem(path)).toBeNull());

  test(`no source is longer than ${longestFile} lines`, () => {
    const sources = [...filesUnder('src'), ...filesUnder('.ci')].filter((path) =>
      /\.(ts|mjs|js|svelte|css)$/.test(path),
    );
    const long = sources
      .map((path) => ({ path, lines: lineCount(read(path)) }))
      .filter(({ lines }) => lines > longestFile);
    expect(long).toEqual([]);
  });
});
