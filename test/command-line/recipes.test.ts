import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { main } from '../../src/command-line/recipes.ts';
import { recipeJsonSchema } from '../../src/core/recipe/json-schema.ts';
import { longestRecipe } from '../../src/core/recipe/parse.ts';
import { shippedFiles, shippedText } from '../core/recipe/shipped.ts';

const folder = mkdtempSync(join(tmpdir(), 'lintfree-recipes-'));
afterAll(() => rmSync(folder, { recursive: true }));

function written(name: string, text: string | Uint8Array): string {
  const file = join(folder, name);
  writeFileSync(file, text);
  return file;
}

const good = shippedText('apc-2-5-single-mode-machine.json');
let printed: string[];
let complained: string[];

beforeEach(() => {
  printed = [];
  complained = [];
  vi.spyOn(console, 'log').mockImplementation((line: string) => void printed.push(line));
  vi.spyOn(console, 'error').mockImplementation((line: string) => void complained.push(line));
  vi.spyOn(process.stdout, 'write').mockImplementation((text) => printed.push(String(text)) > 0);
});
afterEach(() => vi.restoreAllMocks());

describe('good files', () => {
  test('each prints ok', async () => {
    const files = shippedFiles.map((file) => `recipes/${file}`);
    expect(await main(files)).toBe(0);
    expect(printed).toEqual(files.map((file) => `${file}: ok`));
  });
});

describe('bad files', () => {
  test('a problem has file, path inside it, what was expected and what stood there', async () => {
    const file = written('broken.json', good.replace('"angleDeg": 8', '"angleDeg": 9'));
    expect(await main([file])).toBe(1);
    expect(printed).toEqual([
      `${file}: /steps/22/readings/0: The limits of the angle, 7.8 to 8.2, must lie on both sides of 9°. Expected: limits on both sides of 9°. Found: 7.8 to 8.2. [angle-limits]`,
    ]);
  });

  test('one bad file spoils the code, and the good one is still told', async () => {
    const bad = written('bad.json', '{');
    const fine = written('fine.json', good);
    expect(await main([bad, fine])).toBe(1);
    expect(printed).toEqual([expect.stringContaining(`${bad}: whole file: The file is not JSON`), `${fine}: ok`]);
  });

  test('a flood of problems is cut and counted', async () => {
    const file = written(
      'flood.json',
      good.replace('"cautions": ["heat"]', `"cautions": [${'"heat",'.repeat(200)}"heat"]`),
    );
    expect(await main([file])).toBe(1);
    const lines = printed.join('\n').split('\n');
    expect(lines).toHaveLength(51);
    expect(lines.at(-1)).toBe(`${file}: and 150 more problems`);
  });
});

describe('files that cannot be read', () => {
  test.each([
    ['a name that is not there', () => join(folder, 'nowhere.json'), 'there is no such file'],
    ['a folder', () => folder, 'it is a folder, not a file'],
    ['a device', () => '/dev/null', 'it is not an ordinary file'],
    ['bytes that are no text', () => written('bytes.json', new Uint8Array([0x7b, 0xff, 0xfe])), 'it is not UTF-8 text'],
    [
      'a file far too long',
      () => written('long.json', ' '.repeat(longestRecipe * 3 + 1)),
      'it has 600001 bytes; a recipe has at most 600000',
    ],
  ])('%s is told in a sentence', async (_, make, reason) => {
    const file = make();
    expect(await main([file])).toBe(1);
    expect(printed).toEqual([`${file}: cannot be read: ${reason}.`]);
  });
});

describe('calls', () => {
  test('without a file it tells how to call it', async () => {
    expect(await main([])).toBe(2);
    expect(complained.join()).toContain('npm run recipes -- FILE...');
    expect(printed).toEqual([]);
  });

  test('an unknown option is not taken for a file', async () => {
    expect(await main(['--strict', 'recipes/x.json'])).toBe(2);
    expect(printed).toEqual([]);
  });

  test('--help is an answer, not a complaint', async () => {
    expect(await main(['--help'])).toBe(0);
    expect(printed.join()).toContain('npm run recipes -- FILE...');
  });

  test('--schema prints the JSON Schema and nothing else', async () => {
    expect(await main(['--schema'])).toBe(0);
    expect(printed).toEqual([recipeJsonSchema()]);
  });
});
