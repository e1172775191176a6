import { largestLoad, loadToServe, secondsFromMixToLimit } from '../largest-load.ts';
import { pointer, shown, type Problem, type Rule } from '../problem.ts';
import type { Recipe, StepOf } from '../schema.ts';

function mixSteps({ steps }: Recipe): { mix: StepOf<'mix'>; index: number; limit: number }[] {
  return steps.flatMap((mix, index) =>
    mix.kind === 'mix' ? [{ mix, index, limit: steps.findIndex((step) => step.id === mix.limits) }] : [],
  );
}

/** A mix comes before the step that it limits, and that step before the cure. */
export const mixLimitRule: Rule = (recipe) =>
  mixSteps(recipe).flatMap(({ mix, index, limit }): Problem[] => {
    const path = pointer('steps', index, 'limits');
    const found = shown(mix.limits);
    if (limit < 0) {
      const sentence = `The working life of "${mix.id}" limits ${found}, but no step has that id.`;
      return [{ path, code: 'mix-limit-unknown', expected: 'the id of a step', found, sentence }];
    }
    if (limit <= index) {
      const sentence = `A mix comes before the step that it limits; ${found} does not come after "${mix.id}".`;
      return [{ path, code: 'mix-limit-earlier', expected: `a step after "${mix.id}"`, found, sentence }];
    }
    const cure = recipe.steps.findIndex((step, position) => position > index && step.kind === 'cure');
    if (cure >= 0 && limit >= cure) {
      const expected = `a step before the cure "${recipe.steps[cure]?.id ?? ''}"`;
      const sentence = `Working life ends where the cure begins; ${found} is not a step before it.`;
      return [{ path, code: 'mix-limit-cured', expected, found, sentence }];
    }
    return [];
  });

/** The working life is long enough for a load at the standard times. */
export const workingLifeRule: Rule = (recipe) =>
  mixSteps(recipe).flatMap(({ mix, index, limit }): Problem[] => {
    const load = loadToServe(recipe, index);
    const largest = largestLoad(recipe, index);
    if (limit <= index || largest >= load) return [];
    const life = `${recipe.adhesive.workingLifeMinutes} min`;
    const needed = `${Math.ceil(secondsFromMixToLimit(recipe, index, load) / 60)} min`;
    const fits = largest === 0 ? 'Not even one connector fits.' : `The largest load that fits is ${largest}.`;
    return [
      {
        path: '/adhesive/workingLifeMinutes',
        code: 'working-life-short',
        expected: `at least ${needed}, for a load of ${load} from "${mix.id}" to "${mix.limits}"`,
        found: life,
        sentence: `A load of ${load} takes ${needed} from mix to "${mix.limits}", but the working life is ${life}. ${fits}`,
      },
    ];
  });
