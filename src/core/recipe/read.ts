import { limitedSteps, secondsFromMixToLimit } from './largest-load.ts';
import type { Language, Recipe, Step, StepOf } from './schema.ts';

/** The code of a crack in every recipe; it stands in the rules because it may never be polished out. */
export const crackDefect = 'crack';

/** Position of a step, from 0; null where no step has that id. */
export function stepIndex(recipe: Recipe, id: string): number | null {
  const index = recipe.steps.findIndex((step) => step.id === id);
  return index < 0 ? null : index;
}

export function recipeTitle(recipe: Recipe, language: Language): string {
  return recipe.texts[language].name;
}

/** What a defect is called; its code where the recipe does not know it. */
export function defectText(recipe: Recipe, code: string, language: Language): string {
  return recipe.defects.find((defect) => defect.code === code)?.texts[language] ?? code;
}

/** A step that runs by itself between two touches: it is started and ended as a load. */
export type TimedStep = StepOf<'cure'> | StepOf<'wait'> | StepOf<'polish'>;

export function isTimed(step: Step): step is TimedStep {
  return step.kind === 'cure' || step.kind === 'wait' || (step.kind === 'polish' && step.until.kind === 'time');
}

/** How many loads a number of connectors makes at a step; 1 where it does not go load by load. */
export function loadsOf(step: Step, connectors: number): number {
  return step.loadSize === undefined ? 1 : Math.max(1, Math.ceil(connectors / step.loadSize));
}

/** Standard hands-on seconds for a number of connectors: a setup for each load, and each connector. */
export function standardSecondsOf(step: Step, connectors: number): number {
  return step.standard.setupS * loadsOf(step, connectors) + step.standard.eachS * connectors;
}

/** Position of the first cure; null where nothing is cured. */
export function firstCure(recipe: Recipe): number | null {
  const index = recipe.steps.findIndex((step) => step.kind === 'cure');
  return index < 0 ? null : index;
}

/** Whether going back from one step to another means that the cured end is cut off and begun anew. */
export function reterminates(recipe: Recipe, from: number, to: number): boolean {
  return recipe.steps.some((step, index) => step.kind === 'cure' && to <= index && index < from);
}

/** Where a finding at a step sends a connector, by position; null where it is not sent back for it. */
export function wayBack(recipe: Recipe, from: number, defect: string): number | null {
  const way = recipe.steps[from]?.sendsBack.find((entry) => entry.defect === defect);
  return way ? stepIndex(recipe, way.to) : null;
}

/** Position of the mix whose working life runs while a step is done; null where none does. */
export function mixFor(recipe: Recipe, index: number): number | null {
  const step = recipe.steps[index];
  const mix = recipe.steps.findLastIndex(
    (candidate, position) =>
      candidate.kind === 'mix' &&
      position < index &&
      limitedSteps(recipe, position).some((limited) => limited === step),
  );
  return mix < 0 ? null : mix;
}

/** Minutes from mixing until a load of `connectors` has finished the limited step, at the standard times. */
export function minutesFromMixToLimit(recipe: Recipe, mixIndex: number, connectors: number): number {
  return secondsFromMixToLimit(recipe, mixIndex, connectors) / 60;
}

/** What a field rests on: the entry with the longest path that covers it; null where nothing was said. */
export function basisOf(recipe: Recipe, path: string): Recipe['basis'][number] | null {
  const covering = recipe.basis.filter((entry) => path === entry.path || path.startsWith(`${entry.path}/`));
  return covering.reduce<Recipe['basis'][number] | null>(
    (best, entry) => (best && best.path.length >= entry.path.length ? best : entry),
    null,
  );
}
