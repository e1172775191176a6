import { pointer, shown, type Problem, type Rule } from '../problem.ts';
import { crackDefect, reterminates } from '../read.ts';
import type { Recipe, Step } from '../schema.ts';

interface WayBack {
  readonly from: number;
  readonly to: number;
  readonly step: Step;
  readonly defect: string;
  readonly target: string;
  readonly path: string;
}

function waysBack({ steps }: Recipe): WayBack[] {
  return steps.flatMap((step, from) =>
    step.sendsBack.map(({ defect, to: target }, position) => ({
      from,
      to: steps.findIndex((other) => other.id === target),
      step,
      defect,
      target,
      path: pointer('steps', from, 'sendsBack', position),
    })),
  );
}

/** What sends a connector back is a known defect, named once at a step, so that the way back is never a choice. */
export const reworkDefectRule: Rule = (recipe) => {
  const known = new Set(recipe.defects.map((defect) => defect.code));
  return waysBack(recipe).flatMap(({ step, defect, path }, index, all): Problem[] => {
    const found = shown(defect);
    const place = `${path}/defect`;
    if (!known.has(defect)) {
      const sentence = `"${step.id}" sends back for ${found}, which is not in the list of defects.`;
      return [
        { path: place, code: 'rework-defect-unknown', expected: 'a code from the list of defects', found, sentence },
      ];
    }
    if (all.findIndex((other) => other.step === step && other.defect === defect) < index) {
      const sentence = `"${step.id}" sends back for ${found} twice; one finding has one way back.`;
      return [{ path: place, code: 'rework-twice', expected: 'each defect once at a step', found, sentence }];
    }
    return [];
  });
};

/** A connector goes back to an earlier step. */
export const reworkTargetRule: Rule = (recipe) =>
  waysBack(recipe).flatMap(({ from, to, step, target, path }): Problem[] => {
    const place = `${path}/to`;
    const found = shown(target);
    if (to < 0) {
      const sentence = `"${step.id}" sends back to ${found}, but no step has that id.`;
      return [{ path: place, code: 'rework-target-unknown', expected: 'the id of a step', found, sentence }];
    }
    if (to >= from) {
      const sentence = `"${step.id}" cannot send back to ${found}, which does not come before it.`;
      return [{ path: place, code: 'rework-target-later', expected: `a step before "${step.id}"`, found, sentence }];
    }
    return [];
  });

/** A crack is never polished out: the end is cut off or scrapped (NASA-STD-8739.5A). */
export const crackRule: Rule = (recipe) =>
  waysBack(recipe).flatMap(({ from, to, defect, target, path }): Problem[] => {
    const cured = recipe.steps.some((step, index) => step.kind === 'cure' && index < from);
    if (defect !== crackDefect || !cured || to < 0 || to >= from || reterminates(recipe, from, to)) return [];
    return [
      {
        path: `${path}/to`,
        code: 'rework-crack',
        expected: 'a step before the cure, where the end is begun anew',
        found: shown(target),
        sentence: `A crack is never polished out: it cannot go back to ${shown(target)}.`,
      },
    ];
  });

/** Nothing goes back into the working life of a mix that it has left: it must meet a mix again. */
export const reworkMixRule: Rule = (recipe) =>
  waysBack(recipe).flatMap(({ from, to, target, path }): Problem[] => {
    const left = recipe.steps.find((mix, index) => {
      if (mix.kind !== 'mix') return false;
      const limit = recipe.steps.findIndex((step) => step.id === mix.limits);
      return to > index && to <= limit && from > limit;
    });
    if (!left) return [];
    return [
      {
        path: `${path}/to`,
        code: 'rework-without-mix',
        expected: `"${left.id}" or a step before it`,
        found: shown(target),
        sentence: `A connector sent back to ${shown(target)} would have no adhesive: it must go back to "${left.id}" or before.`,
      },
    ];
  });
