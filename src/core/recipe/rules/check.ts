import { pointer, type Problem, type Rule } from '../problem.ts';
import type { StepOf } from '../schema.ts';

type Reading = StepOf<'measure'>['readings'][number];

const checks: readonly string[] = ['inspect', 'measure', 'hold point'];

const units: Readonly<Record<Reading['quantity'], Reading['unit']>> = {
  loss: 'dB',
  'return loss': 'dB',
  'radius of curvature': 'mm',
  'apex offset': 'um',
  'fibre height': 'nm',
  'polish angle': 'deg',
  'key error': 'deg',
};

/** Nothing passes without a last look: the recipe ends in a check. */
export const lastStepRule: Rule = ({ steps }) => {
  const last = steps.at(-1);
  if (!last || checks.includes(last.kind)) return [];
  return [
    {
      path: pointer('steps', steps.length - 1, 'kind'),
      code: 'last-step-check',
      expected: '"inspect", "measure" or "hold point"',
      found: `"${last.kind}"`,
      sentence: `The last step must be a check, not "${last.kind}".`,
    },
  ];
};

function readingProblems(reading: Reading, path: string): Problem[] {
  const { quantity, unit, wavelengthNm, lowest, highest } = reading;
  const problems: Problem[] = [];
  if (unit !== units[quantity]) {
    const sentence = `The ${quantity} is measured in ${units[quantity]}, not in ${unit}.`;
    problems.push({ path: `${path}/unit`, code: 'reading-unit', expected: units[quantity], found: unit, sentence });
  }
  const optical = units[quantity] === 'dB';
  if (optical !== (wavelengthNm !== undefined)) {
    const sentence = optical
      ? `The ${quantity} must say at which wavelength it is measured.`
      : `The ${quantity} has no wavelength.`;
    problems.push({
      path: `${path}/wavelengthNm`,
      code: 'reading-wavelength',
      expected: optical ? 'a wavelength in nm' : 'no wavelength',
      found: wavelengthNm === undefined ? 'nothing' : `${wavelengthNm} nm`,
      sentence,
    });
  }
  if (lowest !== undefined && highest !== undefined && lowest > highest) {
    const sentence = `The lowest ${quantity}, ${lowest}, is above the highest, ${highest}.`;
    problems.push({
      path: `${path}/highest`,
      code: 'reading-order',
      expected: `at least ${lowest}`,
      found: `${highest}`,
      sentence,
    });
  }
  if (units[quantity] === 'dB') {
    for (const [name, limit] of Object.entries({ lowest, highest })) {
      if (limit === undefined || limit >= 0) continue;
      const sentence = `The ${quantity} is a positive number of dB here, so ${limit} cannot be its ${name}.`;
      problems.push({
        path: `${path}/${name}`,
        code: 'reading-sign',
        expected: '0 dB or more',
        found: `${limit}`,
        sentence,
      });
    }
  }
  return problems;
}

/** A measure step measures something, in the unit of the quantity, and return loss is positive (IEC 61300-3-6). */
export const readingRule: Rule = ({ steps }) =>
  steps.flatMap((step, index): Problem[] => {
    if (step.kind !== 'measure') return [];
    const path = pointer('steps', index, 'readings');
    if (step.readings.length === 0) {
      const sentence = `The step "${step.id}" measures nothing.`;
      return [{ path, code: 'reading-none', expected: 'at least one reading', found: 'an empty list', sentence }];
    }
    return step.readings.flatMap((reading, position) => readingProblems(reading, `${path}/${position}`));
  });
