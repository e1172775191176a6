import { describe, expect, test } from 'vitest';
import {
  basisOf,
  defectText,
  firstCure,
  isTimed,
  loadsOf,
  minutesFromMixToLimit,
  mixFor,
  recipeTitle,
  reterminates,
  standardSecondsOf,
  stepIndex,
  wayBack,
} from '../../../src/core/recipe/read.ts';
import { place, shipped, step, upc } from './shipped.ts';

const recipe = upc();
const at = (id: string) => place(recipe, id);

describe('finding things in a recipe', () => {
  test('a step by its id', () => {
    expect(stepIndex(recipe, 'strip')).toBe(2);
    expect(stepIndex(recipe, 'Strip')).toBeNull();
  });

  test('the first cure', () => {
    expect(firstCure(recipe)).toBe(at('cure'));
    expect(firstCure({ ...recipe, steps: [step(recipe, 'strip', 'do')] })).toBeNull();
  });

  test('the mix whose working life runs during a step', () => {
    expect(mixFor(recipe, at('fill'))).toBe(at('mix'));
    expect(mixFor(recipe, at('insert'))).toBe(at('mix'));
    expect(mixFor(recipe, at('mix'))).toBeNull();
    expect(mixFor(recipe, at('crimp'))).toBeNull();
    expect(mixFor(recipe, at('strip'))).toBeNull();
  });

  test('where a finding sends a connector', () => {
    expect(wayBack(recipe, at('inspect-face'), 'scratch')).toBe(at('film-1'));
    expect(wayBack(recipe, at('inspect-face'), 'crack')).toBe(at('prepare'));
    expect(wayBack(recipe, at('inspect-face'), 'dropped')).toBeNull();
    expect(wayBack(recipe, 99, 'scratch')).toBeNull();
  });
});

describe('words', () => {
  test('title and defect, and the code of one that is unknown', () => {
    expect(recipeTitle(recipe, 'en')).toBe('2.5 mm UPC, single-mode, by machine');
    expect(defectText(recipe, 'crack', 'en')).toBe('Crack in the glass');
    expect(defectText(recipe, 'bad-luck', 'en')).toBe('bad-luck');
  });
});

describe('time', () => {
  test('cure, wait and a film by time run by themselves', () => {
    const timed = recipe.steps.filter(isTimed).map(({ id }) => id);
    expect(timed).toEqual(['cure', 'cool', 'film-15', 'film-9', 'film-3', 'film-1', 'film-final']);
  });

  test('a film by strokes does not', () => {
    const hand = shipped('pc-2-5-single-mode-hand');
    expect(hand.steps.filter(isTimed).map(({ id }) => id)).toEqual(['cure', 'cool']);
  });

  test('standard time has a setup for each load', () => {
    const film = step(recipe, 'film-9', 'polish');
    expect([loadsOf(film, 1), loadsOf(film, 12), loadsOf(film, 13), loadsOf(film, 24)]).toEqual([1, 1, 2, 2]);
    expect(standardSecondsOf(film, 12)).toBe(90 + 12 * 4);
    expect(standardSecondsOf(film, 13)).toBe(2 * 90 + 13 * 4);
    expect(standardSecondsOf(step(recipe, 'prepare', 'do'), 13)).toBe(30 + 13 * 30);
  });

  test('no connectors is no load less than one', () => {
    expect(loadsOf(step(recipe, 'prepare', 'do'), 0)).toBe(1);
  });

  test('minutes from mix to the limited step', () => {
    expect(minutesFromMixToLimit(recipe, at('mix'), 12)).toBe((30 + 12 * 30 + 30 + 12 * 45) / 60);
  });
});

describe('cutting off and beginning anew', () => {
  test('is going back over a cure', () => {
    expect(reterminates(recipe, at('inspect-face'), at('prepare'))).toBe(true);
    expect(reterminates(recipe, at('cool'), at('cure'))).toBe(true);
    expect(reterminates(recipe, at('inspect-face'), at('film-1'))).toBe(false);
    expect(reterminates(recipe, at('cure'), at('prepare'))).toBe(false);
    expect(reterminates(recipe, at('insert'), at('prepare'))).toBe(false);
  });
});

describe('what a field rests on', () => {
  test('is told by the nearest entry above it', () => {
    expect(basisOf(recipe, '/steps/22/readings/0/highest')?.source).toContain('MIL-STD-2042-6B');
    expect(basisOf(recipe, '/steps/2/standard/eachS')?.path).toBe('/steps');
    expect(basisOf(recipe, '/texts/en/name')).toBeNull();
  });

  test('a name that only begins alike is another field', () => {
    expect(basisOf({ ...recipe, basis: [{ path: '/strip', rests: 'computed' }] }, '/stripped')).toBeNull();
  });
});
