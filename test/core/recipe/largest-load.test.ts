import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  largestLoad,
  limitedSteps,
  loadToServe,
  secondsFromMixToLimit,
} from '../../../src/core/recipe/largest-load.ts';
import { place, step, upc } from './shipped.ts';

const seconds = fc.integer({ min: 0, max: 600 });
const mixPlace = place(upc(), 'mix');

function timed(lifeMinutes: number, setupS: number, eachS: number) {
  const recipe = upc();
  recipe.adhesive.workingLifeMinutes = lifeMinutes;
  step(recipe, 'fill', 'do').standard = { setupS, eachS };
  step(recipe, 'insert', 'do').standard = { setupS: 0, eachS: 0 };
  return recipe;
}

describe('the largest load of a mix', () => {
  test('law: it fits, and one more does not', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 240 }), seconds, seconds, (life, setupS, eachS) => {
        const recipe = timed(life, setupS, eachS);
        const most = largestLoad(recipe, mixPlace);
        if (most === Infinity) {
          expect(eachS).toBe(0);
          return;
        }
        if (most > 0) expect(secondsFromMixToLimit(recipe, mixPlace, most)).toBeLessThanOrEqual(life * 60);
        expect(secondsFromMixToLimit(recipe, mixPlace, most + 1)).toBeGreaterThan(life * 60);
      }),
      { numRuns: 500 },
    );
  });

  test('is reckoned by hand', () => {
    expect(largestLoad(timed(60, 60, 118), mixPlace)).toBe(30);
    expect(largestLoad(timed(60, 61, 118), mixPlace)).toBe(29);
    expect(largestLoad(timed(1, 61, 0), mixPlace)).toBe(0);
  });

  test('waits between mix and limit count', () => {
    const recipe = timed(60, 0, 100);
    recipe.steps.splice(mixPlace + 1, 0, {
      ...step(recipe, 'cool', 'wait'),
      id: 'settle',
      atLeastS: 600,
      standard: { setupS: 0, eachS: 0 },
    });
    expect(largestLoad(recipe, mixPlace)).toBe(30);
  });
});

describe('what a mix limits', () => {
  test('is the steps after it, up to the named one', () => {
    expect(limitedSteps(upc(), mixPlace).map(({ id }) => id)).toEqual(['fill', 'insert']);
  });

  test('is nothing for a step that is no mix, or a limit that is not there', () => {
    const recipe = upc();
    expect(limitedSteps(recipe, 0)).toEqual([]);
    step(recipe, 'mix', 'mix').limits = 'nowhere';
    expect(limitedSteps(recipe, mixPlace)).toEqual([]);
  });

  test('must last for its largest load, else for the load of the cure', () => {
    const recipe = upc();
    expect(loadToServe(recipe, mixPlace)).toBe(12);
    delete step(recipe, 'fill', 'do').loadSize;
    delete step(recipe, 'insert', 'do').loadSize;
    expect(loadToServe(recipe, mixPlace)).toBe(24);
  });
});
