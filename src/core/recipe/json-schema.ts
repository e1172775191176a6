import * as z from 'zod/mini';
import { recipeSchema } from './schema.ts';

/** The JSON Schema of a recipe file as text, for editors. It knows the shape only; the rules of sense are not in it. */
export function recipeJsonSchema(): string {
  const schema = z.toJSONSchema(recipeSchema, { reused: 'ref' });
  return `${JSON.stringify({ title: 'Lintfree recipe', ...schema }, null, 2)}\n`;
}
