import { basisOf, defectText } from '../core/recipe/read.ts';
import type { Recipe, Step } from '../core/recipe/schema.ts';
import { lowerFirst } from './shift-view.ts';
import type { Words } from '../words/index.ts';

type Basis = Recipe['basis'][number];

/** What a whole part of a recipe rests on, as a sentence; null where nothing was said. */
export function basisSentence(recipe: Recipe, path: string, words: Words): string | null {
  const basis = basisOf(recipe, path);
  return basis ? words.recipes.restsOn(words.recipes.rests[basis.rests], basis.source ?? '') : null;
}

/** What a field rests on where that is not what its part rests on. */
export function fieldBasis(recipe: Recipe, part: string, path: string, words: Words): string | null {
  const basis = basisOf(recipe, path);
  if (!basis || basis === basisOf(recipe, part)) return null;
  return words.recipes.restsOn(words.recipes.rests[basis.rests], basis.source ?? '');
}

/** What single fields of a step rest on; those that rest on the same are told once. */
export function stepBasis(recipe: Recipe, index: number, words: Words): string[] {
  const prefix = `/steps/${index}`;
  const step = recipe.steps[index];
  if (!step) return [];
  const own = recipe.basis.filter(({ path }) => path === prefix || path.startsWith(`${prefix}/`));
  const groups = new Map<string, { readonly basis: Basis; readonly fields: string[] }>();
  for (const basis of own) {
    const key = JSON.stringify([basis.rests, basis.source]);
    const group = groups.get(key) ?? { basis, fields: [] };
    group.fields.push(fieldName(recipe, step, basis.path.slice(prefix.length + 1), words));
    groups.set(key, group);
  }
  return [...groups.values()].map(({ basis, fields }) => {
    const [first = '', ...others] = fields;
    const what = [first, ...others.map(lowerFirst)].join(', ');
    return words.recipes.restsFor(what, words.recipes.rests[basis.rests], basis.source ?? '');
  });
}

function fieldName(recipe: Recipe, step: Step, path: string, words: Words): string {
  const say = words.recipes.steps;
  const [field = '', place = ''] = path.split('/');
  const way = field === 'sendsBack' ? step.sendsBack[Number(place)] : undefined;
  if (way && place !== '') return say.wayBack(lowerFirst(defectText(recipe, way.defect, 'en')));
  if (field === 'readings' && place !== '' && step.kind === 'measure') {
    const reading = step.readings[Number(place)];
    if (reading) return say.reading(readingName(reading));
  }
  return say.field[field] ?? step.texts.en.title;
}

function readingName({ quantity, wavelengthNm }: { quantity: string; wavelengthNm?: number | undefined }): string {
  return wavelengthNm === undefined ? quantity : `${quantity} ${wavelengthNm} nm`;
}
