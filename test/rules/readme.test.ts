import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { help } from '../../.ci/lib/start-options.mjs';
import { fencedLines, inlineCode, withoutFences } from './markdown.ts';
import { read, root } from './project-files.ts';

const { scripts } = JSON.parse(read('package.json')) as { scripts: Record<string, string> };
const npmOwn = ['install', 'ci'];

/** The script that an npm command runs; null for a command of npm's own. */
function scriptOf(command: string): string | null {
  const [, verb = '', name = ''] = command.trim().split(/\s+/);
  if (verb === 'run') return name;
  return npmOwn.includes(verb) ? null : verb;
}

/** Commands in fenced blocks and in running text. */
function npmCommands(markdown: string): string[] {
  return [...fencedLines(markdown), ...inlineCode(withoutFences(markdown))].filter((line) => /^\s*npm /.test(line));
}

const topLevelFile =
  /^(package(-lock)?\.json|tsconfig\.json|svelte\.config\.js|vite\.config\.ts|README\.md|DEVELOPERS\.md|LICENSE)$/;

/** Code that names a file or folder of the checkout. */
function namedPaths(markdown: string): string[] {
  const links = [...markdown.matchAll(/\]\(([^)#\s]+)\)/g)]
    .map((match) => match[1] ?? '')
    .filter((each) => !/^\w+:/.test(each));
  const code = inlineCode(withoutFences(markdown)).filter(
    (each) => topLevelFile.test(each) || /^(\.ci|src|test|recipes|static)\/[\w./+-]*$/.test(each),
  );
  return [...links, ...code];
}

describe.each(['README.md', 'DEVELOPERS.md'])('%s', (page) => {
  const markdown = read(page);

  test('names only npm commands that exist', () => {
    const commands = npmCommands(markdown);
    expect(commands.length).toBeGreaterThan(1);
    expect(commands.filter((each) => !((scriptOf(each) ?? 'start') in scripts))).toEqual([]);
  });

  test('names only files that exist', () => {
    expect(namedPaths(markdown).length).toBeGreaterThan(1);
    expect(namedPaths(markdown).filter((path) => !existsSync(join(root, path)))).toEqual([]);
  });

  test('gives npm start only options that it knows', () => {
    const options = npmCommands(markdown)
      .filter((each) => scriptOf(each) === 'start')
      .flatMap((each) => each.match(/ --[a-z][a-z-]+/g) ?? []);
    expect(options.filter((option) => !help.includes(`${option} `))).toEqual([]);
  });
});

describe('the checks themselves', () => {
  test('an unknown command and an unknown file are seen', () => {
    const planted =
      'Run `npm run polish` or\n\n```sh\nnpm launch\n```\n\nand read `src/attic/a.ts` and [this](nowhere.md).';
    expect(npmCommands(planted).map(scriptOf)).toEqual(['launch', 'polish']);
    expect(namedPaths(planted)).toEqual(['nowhere.md', 'src/attic/a.ts']);
  });

  test('README lists every option of npm start', () => {
    const options = help.match(/^ {2}--[a-z-]+/gm)?.map((each) => each.trim()) ?? [];
    expect(options.length).toBeGreaterThan(5);
    expect(options.filter((option) => !read('README.md').includes(`\`${option}`))).toEqual([]);
  });
});
