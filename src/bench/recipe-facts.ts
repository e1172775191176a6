import { jacketColours } from '../core/recipe/colours.ts';
import type { Recipe } from '../core/recipe/schema.ts';
import { decimals } from '../words/format.ts';
import type { Words } from '../words/index.ts';
import { fieldBasis } from './recipe-basis.ts';
import { lowerFirst } from './shift-view.ts';
import { rangeWords } from './step-words.ts';

/** One line of a recipe's part: what, how much, and what it rests on where that differs from its part. */
export interface RecipeFact {
  readonly name: string;
  readonly value: string;
  readonly basis: readonly string[];
}

export function fitsFacts(recipe: Recipe, words: Words): RecipeFact[] {
  const say = words.recipes.fits;
  const { fits } = recipe;
  const fact = factsOf(recipe, '/fits', words);
  const number = (value: number) => decimals(value, 2);
  const facts = [
    fact(say.ferrule, say.ferruleText(number(fits.ferruleMm), fits.ferruleMaterial), 'ferruleMm', 'ferruleMaterial'),
    fact(say.bore, say.boreText(rangeWords(fits.boreMinUm, fits.boreMaxUm)), 'boreMinUm', 'boreMaxUm'),
    fact(
      say.fibre,
      say.fibreText(
        words.common.fibreKind(fits.fibreKind),
        fits.coresUm.map(number).join(say.or),
        number(fits.claddingUm),
      ),
      'fibreKind',
      'coresUm',
      'claddingUm',
    ),
    fact(say.coating, say.coatingText(number(fits.coatingUm), number(fits.bufferUm)), 'coatingUm', 'bufferUm'),
    fact(
      say.cable,
      say.cableText(fits.cableJacketsMm.map(number).join(say.or), jacketColours[fits.jacketColour].name),
      'cableJacketsMm',
      'jacketColour',
    ),
    fact(say.polish, words.common.polish(fits.polish, fits.angleDeg), 'polish', 'angleDeg'),
  ];
  if (fits.terminus) {
    facts.push(fact(say.terminus, say.terminusText(fits.terminus.name, fits.terminus.channels), 'terminus'));
  }
  return facts;
}

export function stripFacts(recipe: Recipe, words: Words): RecipeFact[] {
  const say = words.recipes.strip;
  const fact = factsOf(recipe, '/strip', words);
  return (['jacketOff', 'strengthMember', 'bareGlass'] as const).map((field) => {
    const { nominalMm, toleranceMm } = recipe.strip[`${field}Mm`];
    return fact(say[field], say.length(decimals(nominalMm, 2), decimals(toleranceMm, 2)), `${field}Mm`);
  });
}

export function adhesiveFacts(recipe: Recipe, words: Words): RecipeFact[] {
  const say = words.recipes.adhesive;
  const { adhesive } = recipe;
  const fact = factsOf(recipe, '/adhesive', words);
  const number = (value: number) => decimals(value, 1);
  const law = adhesive.workingLifeActivationKJPerMol;
  return [
    fact(say.name, adhesive.name, 'name'),
    fact(
      say.life,
      [
        say.lifeText(number(adhesive.workingLifeMinutes), number(adhesive.workingLifeAtC)),
        law === null ? say.lifeFixed : say.lifeLaw(number(law)),
      ].join(', '),
      'workingLifeMinutes',
      'workingLifeAtC',
      'workingLifeActivationKJPerMol',
    ),
    fact(say.lowest, say.celsius(number(adhesive.lowestC)), 'lowestC'),
    fact(say.highest, say.celsius(number(adhesive.highestC)), 'highestC'),
    fact(say.longest, say.longestText(number(adhesive.longestDose)), 'longestDose'),
    fact(say.handling, say.celsius(number(adhesive.handlingC)), 'handlingC'),
  ];
}

export function limitFacts(recipe: Recipe, words: Words): RecipeFact[] {
  const say = words.recipes.limits;
  const { cableMm, parts } = recipe.retermination;
  const fact = factsOf(recipe, '', words);
  return [
    fact(
      say.reterminate,
      say.reterminateText(decimals(cableMm, 0), parts.map(lowerFirst).join(', ')),
      'retermination',
      'retermination/cableMm',
      'retermination/parts',
    ),
    fact(say.repolish, say.repolishText(recipe.repolishLimit), 'repolishLimit'),
  ];
}

/** A line can tell of several fields of a part; each basis of its own is told once. */
const factsOf =
  (recipe: Recipe, part: string, words: Words) =>
  (name: string, value: string, ...fields: readonly string[]): RecipeFact => {
    const bases = fields.flatMap((field) => fieldBasis(recipe, part, `${part}/${field}`, words) ?? []);
    return { name, value, basis: [...new Set(bases)] };
  };
