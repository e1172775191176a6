import { failed, ok, type Result } from '../unit/result.ts';
import { readJson } from './json-text.ts';
import type { Problem } from './problem.ts';
import { senseProblems } from './rules/sense.ts';
import { recipeSchema, type Recipe } from './schema.ts';
import { shapeProblems } from './shape.ts';
import { longestRecipe } from './taken.ts';

export { longestRecipe, readTakenRecipe } from './taken.ts';

function readShape(text: string): Result<Recipe, Problem[]> {
  if (text.length > longestRecipe) {
    const expected = `at most ${longestRecipe} characters`;
    const found = `${text.length} characters`;
    const sentence = `The file has ${found}; a recipe has ${expected}.`;
    return failed([{ path: '', code: 'text-too-long', expected, found, sentence }]);
  }
  const json = readJson(text);
  if (!json.ok) return failed([...json.error]);
  const shape = recipeSchema.safeParse(json.value);
  return shape.success ? ok(shape.data) : failed(shapeProblems(json.value, shape.error.issues));
}

/**
 * Reads a recipe: JSON, then shape, then sense. Never throws. Sense is judged only where the shape is right, so that
 * one mistake does not show as many.
 */
export function readRecipe(text: string): Result<Recipe, Problem[]> {
  const shape = readShape(text);
  if (!shape.ok) return shape;
  const problems = senseProblems(shape.value);
  return problems.length > 0 ? failed(problems) : shape;
}
