import { describe, expect, test } from 'vitest';
import { shipped, shippedFiles } from '../core/recipe/shipped.ts';

const recipes = shippedFiles.map((file) => shipped(file.replace('.json', '')));
const single = recipes.filter(({ fits }) => fits.fibreKind === 'single-mode');
const multi = recipes.filter(({ fits }) => fits.fibreKind === 'multimode');

describe('fibre and cable in the shipped recipes', () => {
  test('glass is 125 µm (cladding of G.652 and multimode fibre, from memory; rule of thumb, common practice, no source)', () => {
    for (const { fits } of recipes) expect(fits.claddingUm).toBe(125);
  });

  test('coated fibre is 250 µm: primary coating 245 to 250 µm (from memory; rule of thumb, common practice, no source)', () => {
    for (const { fits } of recipes) expect(fits.coatingUm).toBe(250);
  });

  test('the buffer is inside 900 ± 50 µm (MIL-PRF-85045/18)', () => {
    for (const { fits } of recipes) expect(Math.abs(fits.bufferUm - 900)).toBeLessThanOrEqual(50);
    for (const { fits } of recipes) expect(fits.bufferUm).toBe(900);
  });

  test('cords are 1.6, 2 and 3 mm (common practice, no source)', () => {
    const jackets = new Set(recipes.flatMap(({ fits }) => fits.cableJacketsMm));
    expect([...jackets].toSorted((a, b) => a - b)).toEqual([1.6, 2, 3]);
  });

  test('cores are 9, 50 and 62.5 µm (multimode 50 and 62.5 ± 2.5 µm, from memory; rule of thumb, common practice, no source)', () => {
    expect(new Set(single.flatMap(({ fits }) => fits.coresUm))).toEqual(new Set([9]));
    expect(new Set(multi.flatMap(({ fits }) => fits.coresUm))).toEqual(new Set([50, 62.5]));
  });

  test('ferrules are 2.5 and 1.25 mm (2.499 and 1.249 ± 0.0005 mm, from memory; rule of thumb, common practice, no source)', () => {
    const connectors = recipes.filter(({ fits }) => fits.terminus === null);
    expect(new Set(connectors.map(({ fits }) => fits.ferruleMm))).toEqual(new Set([1.25, 2.5]));
    for (const { fits } of connectors) expect(fits.ferruleMaterial).toBe('zirconia');
  });

  test('bores are 125 to 126 µm for single-mode, 127 to 128 µm for multimode (from memory)', () => {
    for (const { fits } of single) expect([fits.boreMinUm, fits.boreMaxUm]).toEqual([125, 126]);
    for (const { fits } of multi) expect([fits.boreMinUm, fits.boreMaxUm]).toEqual([127, 128]);
  });

  test('APC is 8° (IEC 61755-3-2:2024, scope; rule of thumb, common practice, no source)', () => {
    for (const { fits } of recipes) expect(fits.angleDeg).toBe(fits.polish === 'APC' ? 8 : 0);
    expect(recipes.filter(({ fits }) => fits.polish === 'APC')).toHaveLength(2);
  });
});

describe('strip lengths in mm: jacket, strength member, bare glass (common practice, no source)', () => {
  test.each([
    ['pc-2-5-single-mode-hand', 30, 6, 16],
    ['upc-2-5-single-mode-machine', 30, 6, 16],
    ['upc-1-25-single-mode-machine', 25, 5, 14],
    ['apc-2-5-single-mode-machine', 30, 6, 16],
    ['apc-1-25-single-mode-machine', 25, 5, 14],
    ['pc-2-5-multimode-hand', 30, 6, 16],
    ['pc-1-25-multimode-machine', 25, 5, 14],
    ['flat-terminus-multimode-hand', 25, 6, 12],
  ])('%s', (id, jacketMm, strengthMemberMm, bareGlassMm) => {
    const { strip } = shipped(id);
    expect(strip.jacketOffMm.nominalMm).toBe(jacketMm);
    expect(strip.strengthMemberMm.nominalMm).toBe(strengthMemberMm);
    expect(strip.bareGlassMm.nominalMm).toBe(bareGlassMm);
  });
});
