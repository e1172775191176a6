import { pointer, shown, type Problem, type ProblemCode, type Rule } from '../problem.ts';

/** One problem for every value that stood in the list before. */
function twice(
  values: readonly (string | number)[],
  code: ProblemCode,
  noun: string,
  path: (index: number) => string,
): Problem[] {
  const before = new Set<string | number>();
  return values.flatMap((value, index) =>
    !before.has(value) && before.add(value)
      ? []
      : [
          {
            path: path(index),
            code,
            expected: `a ${noun} that does not stand above`,
            found: shown(value),
            sentence: `The ${noun} ${shown(value)} stands twice.`,
          },
        ],
  );
}

/** Names mean one thing each, and nothing is listed twice. */
export const identifierRule: Rule = ({ steps, defects, fits }) => [
  ...twice(
    steps.map((step) => step.id),
    'step-twice',
    'step',
    (index) => pointer('steps', index, 'id'),
  ),
  ...twice(
    defects.map((defect) => defect.code),
    'defect-twice',
    'defect',
    (index) => pointer('defects', index, 'code'),
  ),
  ...twice(fits.coresUm, 'listed-twice', 'core', (index) => pointer('fits', 'coresUm', index)),
  ...twice(fits.cableJacketsMm, 'listed-twice', 'jacket', (index) => pointer('fits', 'cableJacketsMm', index)),
  ...steps.flatMap((step, position) =>
    twice(step.cautions, 'listed-twice', 'caution', (index) => pointer('steps', position, 'cautions', index)),
  ),
];
