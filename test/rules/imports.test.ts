import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { importProblems, roomOf } from './import-check.ts';
import { parseImportTable } from './import-table.ts';
import { importsOf } from './imports-of.ts';
import { filesUnder, read, root } from './project-files.ts';

const table = parseImportTable(read('DEVELOPERS.md'));
const exists = (path: string) => existsSync(join(root, path));
const always = () => true;

/** The one problem that a planted file must raise. */
const problemOf = (path: string, text: string) => importProblems(table, [{ path, text }], always).join('\n');

describe('every import in src is one that DEVELOPERS.md allows', () => {
  const sources = filesUnder('src').filter((path) => /\.(ts|js|svelte|css)$/.test(path));

  test('there are sources to check', () => {
    expect(sources.length).toBeGreaterThan(50);
    expect(sources.some((path) => path.endsWith('.svelte'))).toBe(true);
  });

  test('no source reaches where it may not', () => {
    const files = sources.map((path) => ({ path, text: read(path) }));
    expect(importProblems(table, files, exists)).toEqual([]);
  });

  test('the rooms of core stand in one order, so none can reach round in a ring', () => {
    const core = [...table.keys()].filter((name) => name.startsWith('core/'));
    const placed = new Set<string>();
    for (let round = 0; round < core.length; round++) {
      const free = core.filter((name) => table.get(name)?.rooms.every((each) => placed.has(each)));
      free.forEach((name) => placed.add(name));
    }
    expect(core.filter((name) => !placed.has(name))).toEqual([]);
    expect(core.flatMap((name) => table.get(name)?.rooms ?? []).filter((each) => !each.startsWith('core/'))).toEqual(
      [],
    );
  });
});

describe('a planted bad import is found', () => {
  test.each([
    ['src/core/unit/a.ts', "import { b } from '../event/b.ts';"],
    ['src/core/batch/a.ts', "import type { b } from '../timer/b.ts';"],
    ['src/core/timer/a.ts', "export * from '../command/b.ts';"],
    ['src/core/review/a.ts', "const b = await import('../../log/b.ts');"],
    ['src/core/cure/a.ts', "type B = import('../batch/b.ts').B;"],
    ['src/core/batch/a.ts', "import * as z from 'zod/mini';"],
    ['src/core/recipe/a.ts', "import * as z from 'zod';"],
    ['src/core/recipe/a.ts', "import { sha256 } from '@noble/hashes/sha2.js';"],
    ['src/core/event/a.ts', "import { readFileSync } from 'node:fs';"],
    ['src/core/event/a.ts', "import { readFileSync } from 'fs';"],
    ['src/core/unit/a.ts', "import b from '../../../package.json';"],
    ['src/log/a.ts', "import { b } from '../core/batch/b.ts';"],
    ['src/device/a.ts', "import { b } from '../core/event/b.ts';"],
    ['src/device/a.ts', "new Worker(new URL('../log/b.ts', import.meta.url));"],
    ['src/ui/a.ts', "import { b } from '../bench/b.svelte.ts';"],
    [
      'src/ui/a.svelte',
      '<script lang="ts">\n  import { b } from "../device/b.ts";\n  let { c }: { c: number } = $props();\n</script>\n{c}',
    ],
    ['src/ui/a.svelte', '<script module>\n  import { b } from "../log/b.ts";\n</script>'],
    ['src/ui/a.svelte', "{#await import('../routes/b.svelte') then b}{b}{/await}"],
    ['src/ui/a.svelte', "<style>\n  @import '../routes/b.css';\n</style>"],
    ['src/ui/a.css', "@import '../routes/b.css';"],
    ['src/ui/a.css', "p { background: url('../../recipes/b.json'); }"],
    ['src/routes/+page.svelte', '<script>\n  import { b } from "../log/b.ts";\n</script>'],
    ['src/bench/a.ts', "import { b } from '../command-line/b.ts';"],
    ['src/bench/a.ts', "const b = import.meta.glob('../../test/*.ts');"],
    ['src/command-line/a.ts', "import { b } from '../bench/b.ts';"],
    ['src/words/a.ts', "import { b } from '../ui/b.ts';"],
    ['src/service-worker/index.ts', "import { b } from '../bench/b.ts';"],
  ])('%s: %s', (path, text) => {
    expect(problemOf(path, text)).toMatch(/may/);
  });

  test('an alias is told to be relative', () => {
    expect(problemOf('src/routes/+page.ts', "import '$lib/b.ts';")).toContain('relative');
  });

  test('a name that is only known when it runs', () => {
    expect(problemOf('src/ui/a.ts', 'await import(name);')).toContain('cannot be checked');
  });

  test('a room without a row', () => {
    expect(problemOf('src/attic/a.ts', '')).toContain('no row');
  });

  test('a missing ending', () => {
    const file = { path: 'src/core/unit/moment-copy.ts', text: "import type { Moment } from './moment';" };
    expect(importProblems(table, [file], exists).join()).toContain('the ending is written out');
  });
});

describe('a good import is let through', () => {
  test.each([
    ['src/core/unit/a.ts', "import { b } from './b.ts'; // import '../event/b.ts'"],
    ['src/core/command/a.ts', "import { b } from '../timer/b.ts';"],
    ['src/core/recipe/rules/a.ts', "import * as z from 'zod/mini'; import { b } from '../b.ts';"],
    ['src/ui/a.svelte', '<script lang="ts">\n  import type { B } from "../core/batch/b.ts";\n</script>'],
    ['src/bench/a.ts', "const all = import.meta.glob('../../recipes/*.json');"],
    ['src/routes/+page.ts', "import type { PageLoad } from './$types';"],
    ['src/command-line/a.ts', "import { readFile } from 'node:fs/promises';"],
  ])('%s: %s', (path, text) => {
    expect(problemOf(path, text)).toBe('');
  });
});

test('a file is put into its room by its path', () => {
  const paths = [
    'src/core/unit/a.ts',
    'src/core/recipe/rules/a.ts',
    'src/ui/a.ts',
    'src/ui/b/c.ts',
    'src/app.css',
    'recipes/a.json',
  ];
  expect(paths.map(roomOf)).toEqual(['core/unit', 'core/recipe', 'ui', 'ui', 'src', 'recipes']);
});

test('a string that looks like an import is none', () => {
  expect(importsOf('a.ts', 'const text = "import b from \'../c.ts\'"; // import d from "e"')).toEqual([]);
});
