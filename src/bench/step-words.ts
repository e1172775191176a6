import type { Recipe, Step, StepOf } from '../core/recipe/schema.ts';
import { decimals } from '../words/format.ts';
import type { Words } from '../words/index.ts';

/** A range as it is read: "1 to 2", or "75" where both ends are the same. */
export const rangeWords = (low: number, high: number): string =>
  low === high ? decimals(low, 2) : `${decimals(low, 2)} to ${decimals(high, 2)}`;

/** What a step wants in numbers, as short sentences made from the recipe. */
export function stepNumbers(recipe: Recipe, step: Step, words: Words): string[] {
  const say = words.batch.notes;
  switch (step.kind) {
    case 'polish':
      return polishNumbers(step, words);
    case 'cure': {
      const pair = recipe.adhesive.curePairs.find(({ temperatureC }) => temperatureC === step.setPointC);
      return pair ? [say.cure(decimals(step.setPointC, 1), decimals(pair.minutes, 1))] : [];
    }
    case 'wait':
      return [say.atLeast(decimals(step.atLeastS / 60, 1))];
    case 'inspect':
      return [say.criterion(step.criterion, decimals(step.magnification, 0)), say.unconfirmed];
    case 'measure':
      return [...step.readings.map((reading) => readingNumbers(reading, words)), say.unconfirmed];
    case 'hold point':
      return [step.asks];
    default:
      return [];
  }
}

function polishNumbers(step: StepOf<'polish'>, words: Words): string[] {
  const say = words.batch.notes;
  const { pad, until } = step;
  const padText =
    pad.kind === 'rubber'
      ? say.padRubber(rangeWords(pad.hardnessMinShoreA, pad.hardnessMaxShoreA))
      : pad.kind === 'glass'
        ? say.padGlass
        : say.padHand;
  const end =
    until.kind === 'time'
      ? say.time(decimals(until.aimS, 0), decimals(until.toleranceS, 0))
      : until.kind === 'strokes'
        ? say.strokes(until.figureEights)
        : until.sign;
  return [
    `${say.film(decimals(step.filmUm, 2), step.filmMaterial)} ${say.uses(step.usesPerSheet)}`,
    `${say.pad(padText)} ${say.force(rangeWords(step.forceMinN, step.forceMaxN))} ${step.liquid === 'water' ? say.water : say.dry}`,
    end,
  ];
}

function readingNumbers(reading: StepOf<'measure'>['readings'][number], words: Words): string {
  const say = words.batch.notes;
  const { lowest, highest } = reading;
  const unit = words.batch.unit[reading.unit];
  const quantity =
    reading.wavelengthNm === undefined ? reading.quantity : `${reading.quantity} at ${reading.wavelengthNm} nm`;
  if (lowest !== undefined && highest !== undefined) {
    return say.limitBetween(quantity, decimals(lowest, 2), decimals(highest, 2), unit);
  }
  if (lowest !== undefined) return say.limitAtLeast(quantity, decimals(lowest, 2), unit);
  return highest === undefined ? `${quantity}.` : say.limitAtMost(quantity, decimals(highest, 2), unit);
}
