import type { Recipe } from '../recipe/schema.ts';
import type { OpenConnector } from './connectors.ts';
import type { MutableTop } from './mutable.ts';
import type { Batch } from './types.ts';

/** A batch while it is being folded. */
export type OpenBatch = Omit<MutableTop<Batch>, 'connectors' | 'seen'> & {
  connectors: OpenConnector[];
  seen: Record<string, Batch['seen'][string]>;
  stepIndex(id: string): number;
};

const indexes = new WeakMap<Recipe, ReadonlyMap<string, number>>();

/** The position of a step in its recipe, or -1. */
export function stepIndexIn(recipe: Recipe, id: string): number {
  let index = indexes.get(recipe);
  if (!index) {
    index = new Map(recipe.steps.map((step, position) => [step.id, position]));
    indexes.set(recipe, index);
  }
  return index.get(id) ?? -1;
}
