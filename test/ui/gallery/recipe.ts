import apc from '../../../recipes/apc-1-25-single-mode-machine.json' with { type: 'json' };
import terminus from '../../../recipes/flat-terminus-multimode-hand.json' with { type: 'json' };
import upc from '../../../recipes/upc-2-5-single-mode-machine.json' with { type: 'json' };
import { recipeSchema, type Recipe } from '../../../src/core/recipe/schema.ts';

const files: readonly { readonly $schema: string; readonly id: string }[] = [upc, apc, terminus];

/** A recipe of the product by its id, read as the product reads it. */
export function recipeNamed(id: string): Recipe {
  const { $schema: _, ...data } = files.find((file) => file.id === id) ?? upc;
  return recipeSchema.parse(data);
}
