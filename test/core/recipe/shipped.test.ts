import { describe, expect, test } from 'vitest';
import { largestLoad, loadToServe } from '../../../src/core/recipe/largest-load.ts';
import { readRecipe } from '../../../src/core/recipe/parse.ts';
import { reterminates, stepIndex } from '../../../src/core/recipe/read.ts';
import { shipped, shippedFiles, shippedText } from './shipped.ts';

/** R1 to R8. */
const ids = [
  'apc-1-25-single-mode-machine',
  'apc-2-5-single-mode-machine',
  'flat-terminus-multimode-hand',
  'pc-1-25-multimode-machine',
  'pc-2-5-multimode-hand',
  'pc-2-5-single-mode-hand',
  'upc-1-25-single-mode-machine',
  'upc-2-5-single-mode-machine',
];

test('eight recipes are shipped, each in a file of its id', () => {
  expect(shippedFiles.toSorted()).toEqual(ids.map((id) => `${id}.json`));
  for (const id of ids) expect(shipped(id).id).toBe(id);
});

test.each(ids)('%s has no problem', (id) => {
  const read = readRecipe(shippedText(`${id}.json`));
  expect(read.ok ? [] : read.error).toEqual([]);
});

describe.each(ids)('%s', (id) => {
  const recipe = shipped(id);

  test('holds starting values until a shop has qualified it', () => {
    expect(recipe.status).toBe('starting values');
    expect(recipe.texts.en.summary).toContain('Starting values');
  });

  test('goes from cable preparation to a last look', () => {
    const kinds = recipe.steps.map((step) => step.kind);
    expect(kinds.at(0)).toBe('hold point');
    expect(kinds.at(-1)).toBe('hold point');
    const order = [
      'prepare',
      'strip',
      'trim',
      'clean-glass',
      'look-glass',
      'mix',
      'fill',
      'insert',
      'crimp',
      'cure',
      'cool',
    ];
    const after = ['cleave', 'air', 'inspect-film', 'film-final', 'clean-face', 'inspect-face', 'measure', 'release'];
    const places = [...order, ...after].map((step) => stepIndex(recipe, step));
    expect(places).not.toContain(null);
    expect(places).toEqual(places.toSorted((a, b) => Number(a) - Number(b)));
  });

  test('is looked at before the final film and after it', () => {
    const final = stepIndex(recipe, 'film-final') ?? 0;
    expect(recipe.steps[final - 1]?.kind).toBe('inspect');
    expect(recipe.steps.slice(final).some((step) => step.kind === 'inspect')).toBe(true);
  });

  test('sends every crack to be cut off', () => {
    const cure = stepIndex(recipe, 'cure') ?? 0;
    recipe.steps.forEach((step, from) => {
      for (const { defect, to } of step.sendsBack) {
        if (defect !== 'crack') continue;
        expect(from).toBeGreaterThan(cure);
        expect(reterminates(recipe, from, stepIndex(recipe, to) ?? Infinity)).toBe(true);
      }
    });
  });

  test('has a mix that serves more than its largest load', () => {
    const mix = stepIndex(recipe, 'mix') ?? 0;
    expect(largestLoad(recipe, mix)).toBeGreaterThan(loadToServe(recipe, mix));
  });

  test('says what each limit rests on, and names the text where one is known', () => {
    for (const { rests, source } of recipe.basis) {
      if (rests === 'published' || rests === 'computed') expect(source).toBeTruthy();
    }
  });

  test('has words that fit "8 …, next" and end no sentence twice', () => {
    for (const { texts } of recipe.steps) {
      expect(texts.en.done).toMatch(/^[a-z][a-z -]*$/);
      for (const note of texts.en.notes) expect(note).toMatch(/[.]$/);
      expect(texts.en.title).not.toMatch(/[.!]$/);
    }
  });
});
