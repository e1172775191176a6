import { defectText, reterminates, stepIndex } from '../core/recipe/read.ts';
import type { Caution, Recipe, Step } from '../core/recipe/schema.ts';
import { decimals } from '../words/format.ts';
import type { Words } from '../words/index.ts';
import { stepBasis } from './recipe-basis.ts';
import { lowerFirst } from './shift-view.ts';
import { stepNumbers } from './step-words.ts';

export interface StepView {
  readonly id: string;
  readonly number: number;
  readonly title: string;
  /** Kind, who goes, standard time. */
  readonly facts: readonly string[];
  /** Film, limits, times: from the recipe's figures. */
  readonly numbers: readonly string[];
  readonly notes: readonly string[];
  readonly cautions: readonly Caution[];
  /** Which findings send a connector back, by where to. */
  readonly ways: readonly string[];
  readonly basis: readonly string[];
}

export function stepViews(recipe: Recipe, words: Words): StepView[] {
  return recipe.steps.map((step, index) => ({
    id: step.id,
    number: index + 1,
    title: step.texts.en.title,
    facts: [words.recipes.steps.kind[step.kind], goesWords(step, words), standardWords(step, words)],
    numbers: [...stepNumbers(recipe, step, words), ...limitWords(recipe, step, words)],
    notes: step.texts.en.notes,
    cautions: step.cautions,
    ways: waysBack(recipe, index, step, words),
    basis: stepBasis(recipe, index, words),
  }));
}

function goesWords({ goes, loadSize }: Step, words: Words): string {
  const say = words.recipes.steps;
  return loadSize === undefined ? say.goes[goes] : say.loadOf(say.goes[goes], loadSize);
}

function standardWords({ standard: { setupS, eachS } }: Step, words: Words): string {
  const say = words.recipes.steps;
  if (setupS === 0 && eachS === 0) return say.noStandard;
  return say.standard(setupS === 0 ? '' : standardTime(setupS, words), eachS === 0 ? '' : standardTime(eachS, words));
}

/** Exact, unlike a span that only tells how long something takes about. */
function standardTime(seconds: number, words: Words): string {
  const say = words.recipes.steps;
  return seconds < 120 ? say.seconds(decimals(seconds, 1)) : say.minutes(decimals(seconds / 60, 2));
}

function limitWords(recipe: Recipe, step: Step, words: Words): string[] {
  if (step.kind !== 'mix') return [];
  return [words.recipes.steps.limitsStep(titleOf(recipe, step.limits))];
}

function titleOf(recipe: Recipe, id: string): string {
  return recipe.steps.find((step) => step.id === id)?.texts.en.title ?? id;
}

function waysBack(recipe: Recipe, index: number, step: Step, words: Words): string[] {
  const say = words.recipes.steps;
  const byTarget = new Map<string, string[]>();
  for (const { defect, to } of step.sendsBack) {
    byTarget.set(to, [...(byTarget.get(to) ?? []), lowerFirst(defectText(recipe, defect, 'en'))]);
  }
  return [...byTarget].map(([to, defects]) => {
    const target = stepIndex(recipe, to);
    const isAnew = target !== null && reterminates(recipe, index, target);
    return (isAnew ? say.anew : say.back)(titleOf(recipe, to), defects.join('; '));
  });
}
