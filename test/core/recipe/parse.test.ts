import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { walkJson } from '../../../src/core/recipe/json-text.ts';
import { readRecipe, readTakenRecipe } from '../../../src/core/recipe/parse.ts';
import { pointer, problemLine, shown } from '../../../src/core/recipe/problem.ts';
import { brokenTexts } from './broken-texts.ts';
import { shippedFiles, shippedText, upc } from './shipped.ts';

const good = shippedText('upc-2-5-single-mode-machine.json');

describe('a text that is no recipe', () => {
  test.each(brokenTexts)('$what', ({ text, problems, sentence }) => {
    const read = readRecipe(text);
    if (read.ok) throw new Error('it was taken for a recipe');
    expect(read.error.map(({ code, path }) => `${code} ${path}`)).toEqual(problems);
    expect(read.error[0]?.sentence).toBe(sentence);
    expect(readTakenRecipe(text)).toBeNull();
  });

  test('a byte order mark is let pass', () => {
    expect(readRecipe(`\ufeff${good}`).ok).toBe(true);
  });

  test('several mistakes are all told', () => {
    const read = readRecipe(good.replace('"A"', '"first"').replace('"zirconia"', '"glass"'));
    expect(read.ok ? [] : read.error.map(({ path }) => path)).toEqual(['/revision', '/fits/ferruleMaterial']);
  });

  test('a prototype is never touched', () => {
    readRecipe(good.replace('"format": 1', '"format": 1, "__proto__": { "polluted": true }'));
    expect('polluted' in {}).toBe(false);
  });
});

describe('a recipe taken into use earlier', () => {
  test('is read although a rule has come since', () => {
    const recipe = upc();
    recipe.fits.angleDeg = 8;
    const text = JSON.stringify(recipe);
    expect(readRecipe(text).ok).toBe(false);
    expect(readTakenRecipe(text)).toEqual(recipe);
  });
});

describe('no input makes it throw', { timeout: 60_000 }, () => {
  const seen = (text: string) => {
    const read = readRecipe(text);
    const problems = read.ok ? [] : read.error;
    expect(read.ok || problems.length > 0).toBe(true);
    const lines = problems.map((problem) => problemLine('f', problem));
    expect(lines.filter((line) => /\p{Cc}/u.test(line))).toEqual([]);
  };

  test('any text and any JSON', () => {
    fc.assert(fc.property(fc.oneof(fc.string(), fc.string({ unit: 'binary' }), fc.json()), seen), { numRuns: 5000 });
  });

  /** Every path into a JSON value, without the value itself. */
  const paths = (value: unknown): (string | number)[][] =>
    typeof value !== 'object' || value === null
      ? []
      : Object.entries(value).flatMap(([key, inner]) => {
          const own = Array.isArray(value) ? Number(key) : key;
          return [[own], ...paths(inner).map((rest) => [own, ...rest])];
        });

  const places = shippedFiles.flatMap((file) => {
    const document = JSON.parse(shippedText(file)) as unknown;
    return paths(document).map((path) => ({ document, path }));
  });

  test('shipped recipes with any one value replaced', () => {
    fc.assert(
      fc.property(fc.constantFrom(...places), fc.jsonValue(), ({ document, path }, value) => {
        const copy = structuredClone(document);
        const parent = path.slice(0, -1).reduce((at, key) => (at as Record<string, unknown>)[key], copy);
        (parent as Record<string, unknown>)[String(path.at(-1))] = value;
        seen(JSON.stringify(copy));
      }),
      { numRuns: 1000 },
    );
  });

  test('depth', () => {
    for (const mark of ['[', '{"a":']) seen(mark.repeat(30_000));
    seen('['.repeat(90_000) + ']'.repeat(90_000));
    seen(good.replace('"zirconia"', `${'['.repeat(50_000)}${']'.repeat(50_000)}`));
  });

  test('many mistakes in one file, in reasonable time', () => {
    const cautions = good.replace('"cautions": ["heat"]', `"cautions": [${'"heat",'.repeat(20_000)}"heat"]`);
    const read = readRecipe(cautions);
    expect(read.ok ? 0 : read.error.length).toBe(20_000);
    seen(good.replace('"coresUm": [9]', `"coresUm": [${Array.from({ length: 30_000 }, (_, i) => i + 1).join()}]`));
  });
});

describe('the walk over JSON text', { timeout: 60_000 }, () => {
  const parses = (text: string) => {
    try {
      JSON.parse(text);
      return true;
    } catch {
      return false;
    }
  };

  const almost = fc
    .json()
    .chain((text) =>
      fc
        .tuple(
          fc.nat(text.length),
          fc.constantFrom(
            '',
            ',',
            '}',
            ']',
            '{',
            '[',
            ':',
            '"',
            '1',
            '0',
            '.',
            '-',
            'e',
            '\\',
            ' ',
            '\n',
            '\u0007',
            'null',
          ),
        )
        .map(([at, mark]) => text.slice(0, at) + mark + text.slice(mark === '' ? at + 1 : at)),
    );

  test('agrees with JSON.parse on what is JSON', () => {
    fc.assert(
      fc.property(fc.oneof(fc.json(), almost, fc.string()), (text) => {
        expect(walkJson(text).errorAt === null).toBe(parses(text));
      }),
      { numRuns: 5000 },
    );
  });

  test('names a place within the text', () => {
    fc.assert(
      fc.property(almost, (text) => {
        const { errorAt } = walkJson(text);
        if (errorAt === null) return;
        expect(errorAt).toBeGreaterThanOrEqual(0);
        expect(errorAt).toBeLessThanOrEqual(text.length);
      }),
      { numRuns: 1000 },
    );
  });

  test('a field is the same however it is escaped', () => {
    expect(walkJson('{"a":1,"\\u0061":2}').twice.map(({ path }) => path)).toEqual(['/a']);
    expect(walkJson('{"a":{"a":1},"b":[{"a":1},{"a":1,"a":2}]}').twice.map(({ path }) => path)).toEqual(['/b/1/a']);
  });
});

describe('problems in words', () => {
  test('a line has file, path, expected and found', () => {
    const line = problemLine('r.json', {
      path: '/steps/4/to',
      code: 'rework-target-later',
      expected: 'a step before "inspect"',
      found: '"final"',
      sentence: 'It cannot go there.',
    });
    expect(line).toBe(
      'r.json: /steps/4/to: It cannot go there. Expected: a step before "inspect". Found: "final". [rework-target-later]',
    );
  });

  test('pointers are escaped as RFC 6901 says', () => {
    expect(pointer('a/b', 'm~n', 0)).toBe('/a~1b/m~0n/0');
  });

  test('values are short and harmless', () => {
    expect(shown('x'.repeat(100))).toBe(`"${'x'.repeat(60)}…"`);
    expect(shown('\u001b[2J\u202e\u0085')).toBe('"\\u001b[2J\\u202e\\u0085"');
    expect(shown([1, [2]])).toBe('a list of 2');
    expect(shown({})).toBe('an object');
  });
});
