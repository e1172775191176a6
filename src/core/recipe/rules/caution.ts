import { pointer, type Problem, type Rule } from '../problem.ts';
import type { Caution, Recipe, Step } from '../schema.ts';
import { mixFor } from '../read.ts';

/** Words that give away a solvent, whatever the kind of the step. */
const solvent = /\b(alcohol|solvent)\b/i;
/** Pictures of work on the connector's parts, where no bare glass is in the hand. */
const partsOnly: readonly string[] = ['parts', 'fill'];

function words({ texts }: Step): string {
  return [texts.en.title, ...texts.en.notes].join(' ');
}

/** Bare glass is in the hand from the strip until the ferrule's stub is taken down. */
function handlesBareGlass(recipe: Recipe, step: Step, index: number): boolean {
  if (step.kind === 'do' && (step.picture === 'strip' || step.picture === 'cleave')) return true;
  if (step.kind === 'polish') return step.pad.kind === 'hand, in air';
  if (step.kind !== 'do' && step.kind !== 'inspect') return false;
  if (step.kind === 'do' && partsOnly.includes(step.picture)) return false;
  const strip = recipe.steps.findIndex((other) => other.kind === 'do' && other.picture === 'strip');
  const cure = recipe.steps.findIndex((other) => other.kind === 'cure');
  return strip >= 0 && index > strip && index < cure;
}

function handlesAdhesive(recipe: Recipe, step: Step, index: number): boolean {
  return step.kind === 'mix' || (step.kind === 'do' && (step.picture === 'fill' || mixFor(recipe, index) !== null));
}

function meetsHeat(recipe: Recipe, step: Step, index: number): boolean {
  return step.kind === 'cure' || (step.kind === 'wait' && recipe.steps[index - 1]?.kind === 'cure');
}

function meetsLight(step: Step): boolean {
  if (step.kind === 'inspect') return true;
  return step.kind === 'measure' && step.readings.some(({ quantity }) => quantity.endsWith('loss'));
}

/** The cautions that a step must carry, from its kind, its place and its words. */
export function neededCautions(recipe: Recipe, index: number): Caution[] {
  const step = recipe.steps[index];
  if (!step) return [];
  const needed: [Caution, boolean][] = [
    ['bare glass', handlesBareGlass(recipe, step, index)],
    ['solvent', (step.kind === 'do' && step.picture === 'clean') || solvent.test(words(step))],
    ['adhesive', handlesAdhesive(recipe, step, index)],
    ['heat', meetsHeat(recipe, step, index)],
    ['invisible light', meetsLight(step)],
    ['dust', step.kind === 'polish' && step.liquid === 'none'],
  ];
  return needed.flatMap(([caution, needs]) => (needs ? [caution] : []));
}

/** A caution stands where the hazard is. */
export const cautionRule: Rule = (recipe) =>
  recipe.steps.flatMap((step, index) =>
    neededCautions(recipe, index)
      .filter((caution) => !step.cautions.includes(caution))
      .map((caution): Problem => ({
        path: pointer('steps', index, 'cautions'),
        code: 'caution-missing',
        expected: `"${caution}" among the cautions`,
        found: step.cautions.length === 0 ? 'no caution' : step.cautions.map((present) => `"${present}"`).join(', '),
        sentence: `The step "${step.id}" meets ${caution} and must carry that caution.`,
      })),
  );
