import type { Recipe } from '../../../src/core/recipe/schema.ts';

/** A good recipe with one mistake, and all problems that it must give: "code path". */
export interface Broken {
  readonly what: string;
  readonly from: () => Recipe;
  readonly change: (recipe: Recipe) => unknown;
  readonly problems: readonly string[];
}
