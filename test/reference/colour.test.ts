import { describe, expect, test } from 'vitest';
import { bodyColour, fibreColour, fibreColours, jacketColours, tagColour } from '../../src/core/recipe/colours.ts';
import { shipped, shippedFiles } from '../core/recipe/shipped.ts';

const twelve = 'Blue Orange Green Brown Slate White Red Black Yellow Violet Rose Aqua'.split(' ');

describe('fibre colours (TIA-598-C, as an encyclopaedia gives it)', () => {
  test('stand in its order', () => {
    expect(fibreColours.map(({ name }) => name)).toEqual(twelve);
    expect(twelve.map((_, index) => tagColour(index + 1).name)).toEqual(twelve);
  });

  test('repeat above twelve with a black stripe, black with a yellow one', () => {
    for (let fibre = 13; fibre <= 24; fibre += 1) {
      const { colour, stripe } = fibreColour(fibre);
      expect(colour.name).toBe(twelve[fibre - 13]);
      expect(stripe?.name).toBe(colour.name === 'Black' ? 'Yellow' : 'Black');
    }
  });
});

describe('jackets', () => {
  test('each has a colour of its name', () => {
    for (const [key, { name }] of Object.entries(jacketColours)) expect(name.toLowerCase()).toBe(key);
  });

  const jacketOf = (id: string) => shipped(id).fits.jacketColour;

  test('single-mode is yellow (public colour-code page after TIA-598-C; rule of thumb, common practice, no source)', () => {
    const single = shippedFiles.filter((file) => file.includes('single-mode'));
    expect(single).toHaveLength(5);
    for (const file of single) expect(jacketOf(file.replace('.json', ''))).toBe('yellow');
  });

  test('62.5/125 is orange (public colour-code page), and so is plain 50/125 (from memory)', () => {
    expect(shipped('pc-2-5-multimode-hand').fits.coresUm).toEqual([50, 62.5]);
    expect(jacketOf('pc-2-5-multimode-hand')).toBe('orange');
  });

  test('laser-optimised 50/125 is aqua (TIA-598-C, as an encyclopaedia gives it)', () => {
    for (const id of ['pc-1-25-multimode-machine', 'flat-terminus-multimode-hand']) {
      expect(shipped(id).fits.coresUm).toEqual([50]);
      expect(jacketOf(id)).toBe('aqua');
    }
  });
});

describe('connector bodies', () => {
  test('single-mode PC and UPC are blue (public colour-code page)', () => {
    expect(bodyColour({ polish: 'PC', fibreKind: 'single-mode' }, 9).name).toBe('Blue');
    expect(bodyColour({ polish: 'UPC', fibreKind: 'single-mode' }, 9).name).toBe('Blue');
  });

  test('APC is green (from memory)', () => {
    expect(bodyColour({ polish: 'APC', fibreKind: 'single-mode' }, 9).name).toBe('Green');
  });

  test('62.5 µm is beige (public colour-code page), 50 µm black (from memory)', () => {
    expect(bodyColour({ polish: 'PC', fibreKind: 'multimode' }, 62.5).name).toBe('Beige');
    expect(bodyColour({ polish: 'PC', fibreKind: 'multimode' }, 50).name).toBe('Black');
  });
});
