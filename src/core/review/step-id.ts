import type { Batch } from '../batch/types.ts';

/** The id of a step by its position; a folded batch holds no position outside its recipe. */
export function stepIdOf(batch: Batch, position: number): string {
  return batch.recipe.steps[position]?.id ?? '';
}
