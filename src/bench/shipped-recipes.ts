import { readRecipe } from '../core/recipe/parse.ts';
import type { Recipe } from '../core/recipe/schema.ts';

/** A recipe that comes with the program, with the text whose hash names it. */
export interface ShippedRecipe {
  readonly text: string;
  readonly recipe: Recipe;
}

/** Each file is a part of its own, so that the bench page opens without them. */
const files = import.meta.glob<string>('../../recipes/*.json', { query: '?raw', import: 'default' });

/**
 * All recipes that come with the program, by name. A file that is no sound recipe is left out: the tests of the
 * recipes name what is wrong with it.
 */
export async function loadShippedRecipes(): Promise<ShippedRecipe[]> {
  const texts = await Promise.all(Object.values(files).map((load) => load()));
  return readRecipes(texts);
}

export function readRecipes(texts: readonly string[]): ShippedRecipe[] {
  const recipes = texts.flatMap((text): ShippedRecipe[] => {
    const read = readRecipe(text);
    return read.ok ? [{ text, recipe: read.value }] : [];
  });
  return recipes.sort((a, b) => compareTexts(a.recipe.texts.en.name, b.recipe.texts.en.name));
}

const compareTexts = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);
