import { describe, expect, test } from 'vitest';
import { basisSentence, fieldBasis, stepBasis } from '../../src/bench/recipe-basis.ts';
import { adhesiveFacts, fitsFacts, limitFacts, stripFacts } from '../../src/bench/recipe-facts.ts';
import { stepViews } from '../../src/bench/recipe-steps.ts';
import { loadShippedRecipes, readRecipes } from '../../src/bench/shipped-recipes.ts';
import { sha256 } from '../../src/core/event/hash.ts';
import type { Recipe } from '../../src/core/recipe/schema.ts';
import { en } from '../../src/words/en.ts';
import { apc, shippedFiles, shippedText } from '../core/recipe/shipped.ts';

const recipes = await loadShippedRecipes();

describe('shipped recipes', () => {
  test('all of them are read, by name, each with the text of its file', () => {
    expect(recipes).toHaveLength(shippedFiles.length);
    expect(recipes.map(({ text }) => sha256(text)).sort()).toEqual(
      shippedFiles.map((file) => sha256(shippedText(file))).sort(),
    );
    const names = recipes.map(({ recipe }) => recipe.texts.en.name);
    expect(names).toEqual(names.toSorted());
  });

  test('a text that is no recipe is left out', () => {
    const good = recipes[0]?.text ?? '';
    expect(readRecipes(['{', good, '{"format":1}'])).toHaveLength(1);
  });
});

/** Every sentence of the page about what something rests on. */
function basisShown(recipe: Recipe): string {
  const parts = ['/fits', '/strip', '/adhesive', '/steps', '/materials', '/tools', '/defects'];
  const facts = [fitsFacts, stripFacts, adhesiveFacts, limitFacts].flatMap((of) => of(recipe, en));
  return [
    ...parts.map((path) => basisSentence(recipe, path, en)),
    fieldBasis(recipe, '/adhesive', '/adhesive/curePairs', en),
    ...facts.flatMap(({ basis }) => basis),
    ...recipe.steps.flatMap((_, index) => stepBasis(recipe, index, en)),
  ].join('\n');
}

describe('one recipe in full', () => {
  test.each(recipes.map(({ recipe }) => [recipe.id, recipe] as const))(
    '%s says what each field rests on',
    (_, recipe) => {
      const shown = basisShown(recipe);
      const unsaid = recipe.basis.filter(({ rests, source }) => !shown.includes(source ?? en.recipes.rests[rests]));
      expect(unsaid).toEqual([]);
    },
  );

  test('what rests on memory says that it is unconfirmed', () => {
    const recipe = { ...apc(), basis: [{ path: '/strip', rests: 'from memory' as const, source: 'a bench card' }] };
    expect(basisSentence(recipe, '/strip', en)).toBe('Rests on: from memory, unconfirmed (a bench card).');
  });

  test('a field is annotated only where it rests on something else than its part', () => {
    const basis = [
      { path: '/fits', rests: 'from memory' as const },
      { path: '/fits/angleDeg', rests: 'published' as const, source: 'IEC 61755-3-2' },
    ];
    const facts = fitsFacts({ ...apc(), basis }, en);
    expect(facts.filter(({ basis: own }) => own.length > 0)).toEqual([
      { name: 'Polish', value: 'APC 8°', basis: ['Rests on: published (IEC 61755-3-2).'] },
    ]);
  });

  test('standard times are exact, not rounded down', () => {
    const film = stepViews(apc(), en).find(({ id }) => id === 'film-9');
    expect(film?.facts).toEqual(['Polish', 'load by load, 12 at most', 'standard 90 s and 4 s each']);
  });

  test('ways back are told by where to, and which of them cost a connector', () => {
    const inspect = stepViews(apc(), en).find(({ id }) => id === 'inspect-face');
    expect(inspect?.ways).toContain('Back to “Polish on 1 µm diamond”: deep single scratch.');
    expect(inspect?.ways.find((way) => way.includes('crack'))).toMatch(/^Cut off and begun anew at/);
  });
});
