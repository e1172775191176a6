import { pointer, shown, type Problem, type Rule } from '../problem.ts';
import type { Recipe, StepOf } from '../schema.ts';

type Film = StepOf<'polish'>;

/** Polish steps in order, cut where a cure begins anew. */
function polishRuns({ steps }: Recipe): { film: Film; index: number }[][] {
  const runs: { film: Film; index: number }[][] = [[]];
  steps.forEach((step, index) => {
    if (step.kind === 'cure') runs.push([]);
    if (step.kind === 'polish') runs.at(-1)?.push({ film: step, index });
  });
  return runs;
}

const filmName = ({ filmUm, filmMaterial }: Film) => `${filmUm} µm ${filmMaterial}`;

/** Grit only falls. The final film may be repeated, and a grit may be taken again in another material. */
export const gritRule: Rule = (recipe) =>
  polishRuns(recipe).flatMap((run) => {
    const finalUm = run.at(-1)?.film.filmUm;
    return run.slice(1).flatMap(({ film, index }, position): Problem[] => {
      const before = run[position]?.film;
      if (!before || film.filmUm < before.filmUm) return [];
      const path = pointer('steps', index, 'filmUm');
      const found = filmName(film);
      if (film.filmUm > before.filmUm) {
        const expected = `at most ${before.filmUm} µm`;
        const sentence = `Grit only falls: ${found} cannot follow ${filmName(before)}.`;
        return [{ path, code: 'film-coarser', expected, found, sentence }];
      }
      if (film.filmUm === finalUm || film.filmMaterial !== before.filmMaterial) return [];
      const sentence = `${found} is taken twice, but only the final film may be repeated.`;
      return [{ path, code: 'film-repeated', expected: `less than ${before.filmUm} µm`, found, sentence }];
    });
  });

/** The figures of one film agree with each other. */
export const filmRule: Rule = ({ steps }) =>
  steps.flatMap((step, index): Problem[] => {
    if (step.kind !== 'polish') return [];
    const { pad, until } = step;
    const problems: Problem[] = [];
    if (step.forceMinN > step.forceMaxN) {
      problems.push({
        path: pointer('steps', index, 'forceMaxN'),
        code: 'film-force',
        expected: `at least ${step.forceMinN} N`,
        found: `${step.forceMaxN} N`,
        sentence: `The highest force, ${step.forceMaxN} N, is below the lowest, ${step.forceMinN} N.`,
      });
    }
    if (pad.kind === 'rubber' && (pad.hardnessMinShoreA > pad.hardnessMaxShoreA || pad.hardnessMaxShoreA > 100)) {
      problems.push({
        path: pointer('steps', index, 'pad', 'hardnessMaxShoreA'),
        code: 'film-pad',
        expected: `from ${pad.hardnessMinShoreA} to 100 Shore A`,
        found: `${pad.hardnessMaxShoreA} Shore A`,
        sentence: `A pad of ${pad.hardnessMinShoreA} to ${pad.hardnessMaxShoreA} Shore A does not exist.`,
      });
    }
    if (until.kind === 'time' && until.toleranceS >= until.aimS) {
      problems.push({
        path: pointer('steps', index, 'until', 'toleranceS'),
        code: 'film-time',
        expected: `less than ${until.aimS} s`,
        found: `${until.toleranceS} s`,
        sentence: `A tolerance of ${until.toleranceS} s on ${until.aimS} s would let the film be left out.`,
      });
    }
    if (pad.kind === 'hand, in air' && step.liquid !== 'none') {
      problems.push({
        path: pointer('steps', index, 'liquid'),
        code: 'film-air-wet',
        expected: shown('none'),
        found: shown(step.liquid),
        sentence: `A polish in air is dry, not with ${step.liquid}.`,
      });
    }
    return problems;
  });
