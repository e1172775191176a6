import type { Recipe, Step } from '../recipe/schema.ts';

/** Steps that nobody tends: their time is cure time, not hands-on time. */
export function unattended(step: Step): boolean {
  return step.kind === 'cure' || step.kind === 'wait';
}

/** Steps that end in a verdict on each connector. */
export function judges(step: Step): boolean {
  return step.kind === 'inspect' || step.kind === 'measure';
}

const limits = new WeakMap<Recipe, ReadonlySet<number>>();

/** Whether a mix's working life must not be over when this step is finished (or, for a load, begun). */
export function limitedByMix(recipe: Recipe, index: number): boolean {
  let limited = limits.get(recipe);
  if (!limited) {
    const ids = recipe.steps.flatMap((step) => (step.kind === 'mix' ? [step.limits] : []));
    limited = new Set(recipe.steps.flatMap((step, position) => (ids.includes(step.id) ? [position] : [])));
    limits.set(recipe, limited);
  }
  return limited.has(index);
}
