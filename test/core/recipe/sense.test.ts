import { describe, expect, test } from 'vitest';
import { readRecipe } from '../../../src/core/recipe/parse.ts';
import { problemCodes, type Problem } from '../../../src/core/recipe/problem.ts';
import { brokenEndFace } from './broken-end-face.ts';
import { brokenMaterials } from './broken-materials.ts';
import { brokenProcess } from './broken-process.ts';
import { brokenTexts } from './broken-texts.ts';
import type { Broken } from './broken.ts';
import { apc, step, upc } from './shipped.ts';
import { neededCautions } from '../../../src/core/recipe/rules/caution.ts';

const all = [...brokenMaterials, ...brokenProcess, ...brokenEndFace];

function problemsOf({ from, change }: Pick<Broken, 'from' | 'change'>): Problem[] {
  const recipe = from();
  change(recipe);
  const read = readRecipe(JSON.stringify(recipe));
  return read.ok ? [] : read.error;
}

describe('a recipe with one mistake', () => {
  test.each(all)('$what', (broken) => {
    const found = problemsOf(broken);
    expect(found.map(({ code, path }) => `${code} ${path}`)).toEqual(broken.problems);
    for (const { sentence, expected, found: stood } of found) {
      expect(sentence).toMatch(/^.{10,240}\.$/);
      expect(expected).not.toBe('');
      expect(stood).not.toBe('');
    }
  });

  test('every code but the missing caution has a case', () => {
    const reached = [...all.flatMap(({ problems }) => problems), ...brokenTexts.flatMap(({ problems }) => problems)];
    const codes = new Set(reached.map((problem) => problem.split(' ')[0]));
    expect(problemCodes.filter((code) => !codes.has(code))).toEqual(['caution-missing']);
  });
});

describe('cautions', () => {
  const needed = upc().steps.flatMap((_, index) =>
    neededCautions(upc(), index).map((caution) => ({ index, caution, id: upc().steps[index]?.id })),
  );

  test.each(needed)('$id without the caution "$caution"', ({ index, caution }) => {
    const problems = problemsOf({
      from: upc,
      change: ({ steps }) => {
        const step = steps[index];
        if (step) step.cautions = step.cautions.filter((present) => present !== caution);
      },
    });
    expect(problems).toHaveLength(1);
    expect(problems[0]).toMatchObject({ code: 'caution-missing', path: `/steps/${index}/cautions` });
    expect(problems[0]?.expected).toContain(caution);
  });

  test('stand where the hazard is', () => {
    const of = (id: string) =>
      neededCautions(
        upc(),
        upc().steps.findIndex((step) => step.id === id),
      );
    expect(of('strip')).toEqual(['bare glass']);
    expect(of('clean-glass')).toEqual(['bare glass', 'solvent']);
    expect(of('look-glass')).toEqual(['bare glass', 'invisible light']);
    expect(of('mix')).toEqual(['adhesive']);
    expect(of('fill')).toEqual(['adhesive']);
    expect(of('insert')).toEqual(['bare glass', 'adhesive']);
    expect(of('cure')).toEqual(['heat']);
    expect(of('cool')).toEqual(['heat']);
    expect(of('cleave')).toEqual(['bare glass']);
    expect(of('air')).toEqual(['bare glass', 'dust']);
    expect(of('film-9')).toEqual([]);
    expect(of('inspect-film')).toEqual(['solvent', 'invisible light']);
    expect(of('measure')).toEqual(['invisible light']);
    expect(of('release')).toEqual([]);
  });

  test('a dry film makes dust', () => {
    const problems = problemsOf({ from: upc, change: (r) => (step(r, 'film-3', 'polish').liquid = 'none') });
    expect(problems.map(({ code, path }) => `${code} ${path}`)).toEqual(['caution-missing /steps/16/cautions']);
  });
});

describe('what the rules allow', () => {
  const good = (from: Broken['from'], change: Broken['change']) => expect(problemsOf({ from, change })).toEqual([]);

  test('the final film repeated', () => {
    good(upc, (recipe) => {
      const again = { ...structuredClone(step(recipe, 'film-final', 'polish')), id: 'film-final-again' };
      recipe.steps.splice(20, 0, again);
      recipe.status = 'qualified by the shop';
      recipe.basis = [];
    });
  });

  test('a grit taken again in another material', () => {
    good(upc, (recipe) => (step(recipe, 'film-9', 'polish').filmUm = 15));
  });

  test('a cure at room temperature without a cool-down', () => {
    good(upc, (recipe) => {
      recipe.adhesive = {
        ...recipe.adhesive,
        curePairs: [{ temperatureC: 23, minutes: 1440 }],
        curePairsComputedFrom: null,
        lowestC: 18,
        highestC: 60,
      };
      step(recipe, 'cure', 'cure').setPointC = 23;
      recipe.steps = recipe.steps.filter(({ id }) => id !== 'cool');
      recipe.status = 'qualified by the shop';
      recipe.basis = [];
    });
  });

  test('pairs from a maker, not computed', () => {
    good(apc, ({ adhesive }) => {
      adhesive.curePairsComputedFrom = null;
      adhesive.curePairs = [{ temperatureC: 100, minutes: 17 }];
    });
  });

  test('lengths that only binary fractions part', () => {
    good(upc, ({ strip }) => {
      strip.jacketOffMm = { nominalMm: 23.4, toleranceMm: 0.1 };
      strip.bareGlassMm = { nominalMm: 16.1, toleranceMm: 0.1 };
      strip.strengthMemberMm = { nominalMm: 7, toleranceMm: 0.1 };
    });
  });
});

describe('sentences name the thing, the rule and the value', () => {
  const sentenceOf = (what: string) => {
    const broken = all.find((candidate) => candidate.what === what);
    return broken && problemsOf(broken)[0]?.sentence;
  };

  test.each([
    ['a film coarser than the one before', 'Grit only falls: 10 µm diamond cannot follow 9 µm diamond.'],
    [
      'a working life too short for a load',
      'A load of 12 takes 16 min from mix to "insert", but the working life is 15 min. The largest load that fits is 11.',
    ],
    [
      'bare glass and strength member longer than the jacket taken off',
      'Bare glass and strength member take up to 23.5 mm, but only 23.4 mm of jacket come off.',
    ],
    ['a crack polished out', 'A crack is never polished out: it cannot go back to "film-15".'],
  ])('%s', (what, sentence) => {
    expect(sentenceOf(what)).toBe(sentence);
  });
});
