import { readJson } from './json-text.ts';
import { recipeSchema, type Recipe } from './schema.ts';

/** The longest text of a recipe, in UTF-16 code units. */
export const longestRecipe = 200_000;

/**
 * Reads a recipe that was taken into use earlier: shape only. Its sense was judged when it was taken, and a rule that
 * came later must not make an old batch unreadable. Apart from the rules, so that a start need not load them.
 */
export function readTakenRecipe(text: string): Recipe | null {
  if (text.length > longestRecipe) return null;
  const json = readJson(text);
  if (!json.ok) return null;
  const shape = recipeSchema.safeParse(json.value);
  return shape.success ? shape.data : null;
}
