import { readdirSync, readFileSync } from 'node:fs';
import { readRecipe } from '../../../src/core/recipe/parse.ts';
import type { Recipe, StepKind, StepOf } from '../../../src/core/recipe/schema.ts';

const folder = new URL('../../../recipes/', import.meta.url);

export const shippedFiles = readdirSync(folder).filter((name) => name.endsWith('.json'));

export function shippedText(file: string): string {
  return readFileSync(new URL(file, folder), 'utf8');
}

const good = new Map<string, Recipe>();

/** A shipped recipe by its id, as a copy that a test may break. */
export function shipped(id: string): Recipe {
  const known = good.get(id) ?? readGood(id);
  good.set(id, known);
  return structuredClone(known);
}

function readGood(id: string): Recipe {
  const read = readRecipe(shippedText(`${id}.json`));
  if (!read.ok) throw new Error(`${id} is not a good recipe: ${JSON.stringify(read.error)}`);
  return read.value;
}

export const upc = () => shipped('upc-2-5-single-mode-machine');
export const apc = () => shipped('apc-2-5-single-mode-machine');

/** A step that a test knows to be there. */
export function step<Kind extends StepKind>(recipe: Recipe, id: string, kind: Kind): StepOf<Kind> {
  const found = recipe.steps.find((candidate) => candidate.id === id);
  if (found?.kind !== kind) throw new Error(`no step "${id}" of the kind "${kind}"`);
  return found as StepOf<Kind>;
}

export function place(recipe: Recipe, id: string): number {
  const index = recipe.steps.findIndex((candidate) => candidate.id === id);
  if (index < 0) throw new Error(`no step "${id}"`);
  return index;
}
