import type { Recipe } from '../schema.ts';
import { pointer, type Problem, type Rule } from '../problem.ts';

const gasConstantJPerMolK = 8.314463;
const kelvin = (celsius: number) => celsius + 273.15;
/** Computed minutes may be rounded by this much: a twentieth of a minute, or half a per cent of longer times. */
const roundingMinutes = 0.05;
const roundingShare = 0.005;
/** Smooth metal hotter than this burns skin on a short touch (ISO 13732-1, from memory). */
const hottestHandlingC = 60;

/** Minutes at another temperature by Arrhenius' law from one pair and an activation energy. */
export function arrheniusMinutes(
  from: { temperatureC: number; minutes: number; activationKJPerMol: number },
  temperatureC: number,
): number {
  const inverseKelvin = 1 / kelvin(temperatureC) - 1 / kelvin(from.temperatureC);
  return from.minutes * Math.exp(((from.activationKJPerMol * 1000) / gasConstantJPerMolK) * inverseKelvin);
}

/** The temperatures of an adhesive stand in order, and hands are not burnt. */
export const adhesiveRangeRule: Rule = ({ adhesive: { lowestC, highestC, longestDose, handlingC } }) => {
  const problems: Problem[] = [];
  if (lowestC >= highestC) {
    problems.push({
      path: '/adhesive/highestC',
      code: 'adhesive-range',
      expected: `more than the lowest, ${lowestC} °C`,
      found: `${highestC} °C`,
      sentence: `The highest temperature, ${highestC} °C, is not above the lowest, ${lowestC} °C.`,
    });
  }
  if (longestDose <= 1) {
    problems.push({
      path: '/adhesive/longestDose',
      code: 'longest-dose',
      expected: 'more than 1, which is a full cure',
      found: String(longestDose),
      sentence: `With a longest dose of ${longestDose} a cure would be over as soon as it is done.`,
    });
  }
  if (handlingC > hottestHandlingC) {
    problems.push({
      path: '/adhesive/handlingC',
      code: 'handling-hot',
      expected: `at most ${hottestHandlingC} °C`,
      found: `${handlingC} °C`,
      sentence: `${handlingC} °C burns a hand; handling is safe up to ${hottestHandlingC} °C.`,
    });
  }
  return problems;
};

/** Pairs lie inside the adhesive's limits, in rising order of temperature, and hotter is shorter. */
export const curePairRule: Rule = ({ adhesive: { curePairs, lowestC, highestC } }) =>
  curePairs.flatMap((pair, index) => {
    const problems: Problem[] = [];
    const before = curePairs[index - 1];
    if (pair.temperatureC < lowestC || pair.temperatureC > highestC) {
      problems.push({
        path: pointer('adhesive', 'curePairs', index, 'temperatureC'),
        code: 'cure-pair-range',
        expected: `from ${lowestC} to ${highestC} °C`,
        found: `${pair.temperatureC} °C`,
        sentence: `A cure at ${pair.temperatureC} °C is outside the adhesive's limits, ${lowestC} to ${highestC} °C.`,
      });
    }
    if (before && pair.temperatureC <= before.temperatureC) {
      problems.push({
        path: pointer('adhesive', 'curePairs', index, 'temperatureC'),
        code: 'cure-pair-order',
        expected: `more than ${before.temperatureC} °C`,
        found: `${pair.temperatureC} °C`,
        sentence: `Cure pairs stand in rising order: ${pair.temperatureC} °C cannot follow ${before.temperatureC} °C.`,
      });
    } else if (before && pair.minutes >= before.minutes) {
      problems.push({
        path: pointer('adhesive', 'curePairs', index, 'minutes'),
        code: 'cure-pair-fall',
        expected: `less than ${before.minutes} min`,
        found: `${pair.minutes} min`,
        sentence: `Hotter cures faster: ${pair.minutes} min at ${pair.temperatureC} °C is not less than ${before.minutes} min at ${before.temperatureC} °C.`,
      });
    }
    return problems;
  });

/** Pairs said to be computed are what the stated origin gives, within rounding. */
export const computedPairRule: Rule = ({ adhesive: { curePairs, curePairsComputedFrom: origin } }) => {
  if (!origin) return [];
  return curePairs.flatMap((pair, index) => {
    const minutes = arrheniusMinutes(origin, pair.temperatureC);
    if (Math.abs(pair.minutes - minutes) <= Math.max(roundingMinutes, minutes * roundingShare)) return [];
    return [
      {
        path: pointer('adhesive', 'curePairs', index, 'minutes'),
        code: 'cure-pair-computed',
        expected: `${minutes.toFixed(2)} min`,
        found: `${pair.minutes} min`,
        sentence: `${origin.minutes} min at ${origin.temperatureC} °C and ${origin.activationKJPerMol} kJ/mol give ${minutes.toFixed(2)} min at ${pair.temperatureC} °C, not ${pair.minutes} min.`,
      },
    ];
  });
};

/** An oven is set inside the adhesive's limits. */
export const setPointRule: Rule = ({ steps, adhesive: { lowestC, highestC } }) =>
  steps.flatMap((step, index): Problem[] => {
    if (step.kind !== 'cure' || (step.setPointC >= lowestC && step.setPointC <= highestC)) return [];
    return [
      {
        path: pointer('steps', index, 'setPointC'),
        code: 'cure-set-point',
        expected: `from ${lowestC} to ${highestC} °C`,
        found: `${step.setPointC} °C`,
        sentence: `An oven set to ${step.setPointC} °C is outside the adhesive's limits, ${lowestC} to ${highestC} °C.`,
      },
    ];
  });

const isCoolDown = (step: Recipe['steps'][number] | undefined) => step?.kind === 'wait';

/** Nothing that comes hot out of an oven meets a hand before it has cooled. */
export const coolDownRule: Rule = ({ steps, adhesive: { handlingC } }) =>
  steps.flatMap((step, index): Problem[] => {
    const next = steps[index + 1];
    if (step.kind !== 'cure' || step.setPointC <= handlingC || isCoolDown(next)) return [];
    return [
      {
        path: next ? pointer('steps', index + 1) : pointer('steps', index),
        code: 'cool-down-missing',
        expected: `a wait that lets "${step.id}" cool to ${handlingC} °C`,
        found: next ? `"${next.id}", a step of the kind "${next.kind}"` : 'the end of the recipe',
        sentence: `The cure "${step.id}" at ${step.setPointC} °C must be followed by a cool-down before hands.`,
      },
    ];
  });
