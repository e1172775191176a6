import { pointer, shown, type Problem, type Rule } from '../problem.ts';
import { basisOf } from '../read.ts';
import type { Recipe } from '../schema.ts';

/** Fields whose figures nobody can check by looking at the recipe alone. */
const restingFields: readonly string[] = [
  'fits',
  'strip',
  'adhesive',
  'retermination',
  'repolishLimit',
  'defects',
  'steps',
];

function exists(root: unknown, path: string): boolean {
  let value = root;
  for (const part of path.slice(1).split('/')) {
    const key = part.replaceAll('~1', '/').replaceAll('~0', '~');
    if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return false;
    if (Array.isArray(value) && !/^\d+$/.test(key)) return false;
    value = (value as Record<string, unknown>)[key];
  }
  return true;
}

/** A basis speaks of something that stands in the recipe, and what was published names where. */
export const basisRule: Rule = (recipe) =>
  recipe.basis.flatMap(({ path, rests, source }, index): Problem[] => {
    if (!exists(recipe, path)) {
      const sentence = `A basis names ${shown(path)}, but nothing stands there.`;
      const expected = 'the path of a field in this recipe';
      return [{ path: pointer('basis', index, 'path'), code: 'basis-path', expected, found: shown(path), sentence }];
    }
    if (rests === 'published' && source === undefined) {
      const sentence = `${shown(path)} is said to rest on something published, but no source is named.`;
      const expected = 'the source';
      return [{ path: pointer('basis', index, 'source'), code: 'basis-source', expected, found: 'nothing', sentence }];
    }
    return [];
  });

function missing(path: string, what: string): Problem {
  return {
    path,
    code: 'basis-missing',
    expected: `a basis entry that covers ${path}`,
    found: 'none',
    sentence: `The recipe does not say what ${what} rests on.`,
  };
}

function limitedReadings({ steps }: Recipe): string[] {
  return steps.flatMap((step, index) =>
    step.kind === 'measure'
      ? step.readings.flatMap(({ lowest, highest }, position) =>
          lowest === undefined && highest === undefined ? [] : [pointer('steps', index, 'readings', position)],
        )
      : [],
  );
}

/**
 * While a recipe holds starting values, each figure says what it rests on; a limit that passes or fails a connector
 * needs more than the word for all steps. Once qualified, it rests on the shop's own work.
 */
export const basisCoverRule: Rule = (recipe) => {
  if (recipe.status !== 'starting values') return [];
  const computed = recipe.adhesive.curePairsComputedFrom !== null;
  const pairs = '/adhesive/curePairs';
  return [
    ...restingFields
      .filter((field) => basisOf(recipe, `/${field}`) === null)
      .map((field) => missing(`/${field}`, `"${field}"`)),
    ...limitedReadings(recipe)
      .filter((path) => !basisOf(recipe, path)?.path.includes('/readings'))
      .map((path) => missing(path, 'this limit')),
    ...(computed && basisOf(recipe, pairs)?.rests !== 'computed' ? [missing(pairs, 'the computed pairs')] : []),
  ];
};
