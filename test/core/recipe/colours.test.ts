import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  bodyColour,
  contrast,
  fibreColour,
  fibreColours,
  jacketColours,
  luminance,
  tagColour,
} from '../../../src/core/recipe/colours.ts';

describe('contrast (WCAG 2.2, relative luminance and contrast ratio)', () => {
  test('black on white is 21:1, a colour on itself 1:1', () => {
    expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 10);
    expect(contrast('#1B52A8', '#1B52A8')).toBe(1);
  });

  test('#767676 on white just passes 4.5:1 and #777777 just fails', () => {
    expect(contrast('#767676', '#FFFFFF')).toBeGreaterThanOrEqual(4.5);
    expect(contrast('#777777', '#FFFFFF')).toBeLessThan(4.5);
  });

  test('luminance runs from 0 to 1', () => {
    expect([luminance('#000000'), luminance('#FFFFFF')]).toEqual([0, 1]);
  });
});

const named = [...fibreColours, ...Object.values(jacketColours)];
const bodies = [
  bodyColour({ polish: 'APC', fibreKind: 'single-mode' }, 9),
  bodyColour({ polish: 'UPC', fibreKind: 'single-mode' }, 9),
  bodyColour({ polish: 'PC', fibreKind: 'multimode' }, 62.5),
  bodyColour({ polish: 'PC', fibreKind: 'multimode' }, 50),
];

test.each([...named, ...bodies])('words on $name $hex keep 7:1', ({ hex, inkHex }) => {
  expect(contrast(hex, inkHex)).toBeGreaterThanOrEqual(7);
});

describe('tags', () => {
  test('twelve differ from each other', () => {
    expect(new Set(fibreColours.map(({ hex }) => hex)).size).toBe(12);
    expect(new Set(fibreColours.map(({ name }) => name)).size).toBe(12);
  });

  test('a number outside 1 to 12 comes round again', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1000, max: 1000 }), (tag) => {
        expect(tagColour(tag + 12)).toBe(tagColour(tag));
        expect(fibreColours).toContain(tagColour(tag));
      }),
      { numRuns: 200 },
    );
  });
});

describe('fibres past the twelfth', () => {
  test('carry a stripe that shows on their colour', () => {
    expect(fibreColour(12).stripe).toBeNull();
    expect(fibreColour(13)).toMatchObject({ colour: { name: 'Blue' }, stripe: { name: 'Black' } });
    expect(fibreColour(20)).toMatchObject({ colour: { name: 'Black' }, stripe: { name: 'Yellow' } });
  });
});
