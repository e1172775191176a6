import type { Recipe, Step } from './schema.ts';

/** The steps that run against the working life of the mix at `mixIndex`: those after it, up to the one it limits. */
export function limitedSteps(recipe: Recipe, mixIndex: number): readonly Step[] {
  const mix = recipe.steps[mixIndex];
  if (mix?.kind !== 'mix') return [];
  const limit = recipe.steps.findIndex((step) => step.id === mix.limits);
  return recipe.steps.slice(mixIndex + 1, Math.max(limit, mixIndex) + 1);
}

/** Seconds that a step runs whatever the number of connectors, beside the standard time of hands. */
function machineS(step: Step): number {
  if (step.kind === 'wait') return step.atLeastS;
  return step.kind === 'polish' && step.until.kind === 'time' ? step.until.aimS : 0;
}

const sum = (numbers: readonly number[]) => numbers.reduce((total, number) => total + number, 0);

/** Seconds from mixing until `connectors`, worked as one load, have finished the limited step at the standard times. */
export function secondsFromMixToLimit(recipe: Recipe, mixIndex: number, connectors: number): number {
  const steps = limitedSteps(recipe, mixIndex);
  return sum(steps.map((step) => step.standard.setupS + machineS(step) + step.standard.eachS * connectors));
}

/**
 * The most connectors that can be worked as one load inside the working life of a mix, at the standard times and the
 * reference temperature. 0 where not even one can; Infinity where the number makes no difference.
 */
export function largestLoad(recipe: Recipe, mixIndex: number): number {
  const lifeS = recipe.adhesive.workingLifeMinutes * 60;
  const fixedS = secondsFromMixToLimit(recipe, mixIndex, 0);
  const eachS = secondsFromMixToLimit(recipe, mixIndex, 1) - fixedS;
  if (fixedS > lifeS) return 0;
  return eachS === 0 ? Infinity : Math.floor((lifeS - fixedS) / eachS);
}

/** How many connectors one mix has to serve at least: the largest load of its steps, else of the cure that follows. */
export function loadToServe(recipe: Recipe, mixIndex: number): number {
  const sizes = limitedSteps(recipe, mixIndex).map((step) => step.loadSize ?? 1);
  const cure = recipe.steps.find((step, index) => index > mixIndex && step.kind === 'cure');
  const largest = Math.max(1, ...sizes);
  return largest > 1 ? largest : (cure?.loadSize ?? 1);
}
