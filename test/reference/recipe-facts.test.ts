import { describe, expect, test } from 'vitest';
import { arrheniusMinutes } from '../../src/core/recipe/rules/adhesive.ts';
import { basisOf } from '../../src/core/recipe/read.ts';
import { shipped, shippedFiles, step } from '../core/recipe/shipped.ts';

const ids = shippedFiles.map((file) => file.replace('.json', ''));

describe('adhesive', () => {
  const origin = { temperatureC: 100, minutes: 20, activationKJPerMol: 60 };

  test.each([
    [80, 59.8],
    [120, 7.5],
  ])(
    '20 min at 100 °C and 60 kJ/mol are %d °C, %d min (computed: Arrhenius with R = 8.314463 and 273.15 K)',
    (c, minutes) => {
      expect(arrheniusMinutes(origin, c)).toBeCloseTo(minutes, 1);
    },
  );

  test.each([
    [80, 0.3345],
    [90, 0.5871],
    [95, 0.769],
    [105, 1.2914],
    [110, 1.6565],
    [120, 2.6746],
    [130, 4.2169],
  ])('rate at %d °C is %d times that at 100 °C (computed table for 60 kJ/mol)', (c, factor) => {
    expect(20 / arrheniusMinutes(origin, c)).toBeCloseTo(factor, 4);
  });

  test.each(ids)(
    '%s: 20 min at 100 °C, 85 °C at least, 60 min of life at 23 °C, 40 °C in the hand (common practice, no source)',
    (id) => {
      const { adhesive } = shipped(id);
      expect(adhesive.curePairsComputedFrom).toEqual(origin);
      expect(adhesive.curePairs.map(({ temperatureC }) => temperatureC)).toEqual([85, 100, 120]);
      for (const pair of adhesive.curePairs) {
        expect(pair.minutes).toBeCloseTo(arrheniusMinutes(origin, pair.temperatureC), 1);
      }
      expect(adhesive).toMatchObject({ lowestC: 85, workingLifeMinutes: 60, workingLifeAtC: 23, handlingC: 40 });
      expect(basisOf(shipped(id), '/adhesive/curePairs')?.rests).toBe('computed');
      expect(basisOf(shipped(id), '/adhesive/longestDose')?.rests).toBe('common practice, no source');
    },
  );
});

/** Film in µm and material, then seconds, strokes or "look", for the whole run from the polish in air. */
function films(id: string): string[] {
  return shipped(id).steps.flatMap((step) => {
    if (step.kind !== 'polish') return [];
    const { until } = step;
    const end =
      until.kind === 'time' ? `${until.aimS} s` : until.kind === 'strokes' ? `${until.figureEights} F8` : 'look';
    return [`${step.filmUm} ${step.filmMaterial} ${end}`];
  });
}

function pads(id: string): string[] {
  return shipped(id).steps.flatMap((step) => {
    if (step.kind !== 'polish') return [];
    if (step.pad.kind !== 'rubber') return [step.pad.kind];
    const { hardnessMinShoreA: min, hardnessMaxShoreA: max } = step.pad;
    return [min === max ? `${min}` : `${min}-${max}`];
  });
}

const oxide = 'aluminium oxide';
const carbide = 'silicon carbide';

describe('films, from the polish in air to the last (common practice, no source)', () => {
  test.each([
    [
      'pc-2-5-single-mode-hand',
      [`12 ${oxide} look`, '9 diamond 10 F8', '3 diamond 15 F8', '1 diamond 20 F8', '0.05 silica 15 F8'],
    ],
    [
      'upc-2-5-single-mode-machine',
      [
        `15 ${oxide} look`,
        `15 ${carbide} 30 s`,
        '9 diamond 60 s',
        '3 diamond 60 s',
        '1 diamond 60 s',
        '0.05 silica 45 s',
      ],
    ],
    [
      'upc-1-25-single-mode-machine',
      [
        `12 ${oxide} look`,
        `9 ${carbide} 20 s`,
        '6 diamond 40 s',
        '3 diamond 40 s',
        '1 diamond 45 s',
        '0.05 silica 30 s',
      ],
    ],
    [
      'apc-2-5-single-mode-machine',
      [
        `15 ${oxide} look`,
        `15 ${carbide} 30 s`,
        '9 diamond 60 s',
        '3 diamond 60 s',
        '1 diamond 60 s',
        '0.05 silica 60 s',
      ],
    ],
    [
      'apc-1-25-single-mode-machine',
      [
        `12 ${oxide} look`,
        `9 ${carbide} 20 s`,
        '9 diamond 40 s',
        '3 diamond 45 s',
        '1 diamond 45 s',
        '0.05 silica 45 s',
      ],
    ],
    ['pc-2-5-multimode-hand', [`12 ${oxide} look`, `3 ${oxide} 18 F8`, `1 ${oxide} 12 F8`]],
    [
      'pc-1-25-multimode-machine',
      [`12 ${oxide} look`, `9 ${carbide} 20 s`, '3 diamond 40 s', '1 diamond 40 s', '0.05 silica 20 s'],
    ],
    [
      'flat-terminus-multimode-hand',
      [`12 ${oxide} look`, `5 ${oxide} 20 F8`, `1 ${oxide} 20 F8`, `0.3 ${oxide} 15 F8`],
    ],
  ])('%s', (id, run) => {
    expect(films(id)).toEqual(run);
  });
});

describe('pads in Shore A (common practice, no source)', () => {
  const air = 'hand, in air';
  test.each([
    ['pc-2-5-single-mode-hand', [air, '80-85', '80-85', '80-85', '80-85']],
    ['upc-2-5-single-mode-machine', [air, '90', '80', '75-80', '75', '70']],
    ['upc-1-25-single-mode-machine', [air, '85', '80', '80', '75', '70']],
    ['apc-2-5-single-mode-machine', [air, '85', '75', '70', '70', '65-70']],
    ['apc-1-25-single-mode-machine', [air, '80', '75', '70', '70', '65']],
    ['pc-2-5-multimode-hand', [air, '70-80', '70-80']],
    ['pc-1-25-multimode-machine', [air, '80', '75', '75', '70']],
    ['flat-terminus-multimode-hand', [air, 'glass', 'glass', 'glass']],
  ])('%s', (id, run) => {
    expect(pads(id)).toEqual(run);
  });
});

describe('limits', () => {
  const limits = (id: string, quantity: string) =>
    shipped(id).steps.flatMap((step) =>
      step.kind === 'measure' ? step.readings.filter((reading) => reading.quantity === quantity) : [],
    );

  test.each(ids)('%s: a mated pair loses 0.75 dB at most (MIL-STD-2042-6B, tables 6C1-IV and 6E1-IV)', (id) => {
    const losses = limits(id, 'loss');
    expect(losses).toHaveLength(2);
    for (const { highest } of losses) expect(highest).toBe(0.75);
  });

  test.each([
    ['pc-2-5-single-mode-hand', 40, 'MIL-PRF-29504B 3.5.3: single-mode reflectance -40 dB'],
    ['upc-2-5-single-mode-machine', 45, 'IEC 61753-1 grade 2, from memory'],
    ['upc-1-25-single-mode-machine', 45, 'IEC 61753-1 grade 2, from memory'],
    ['apc-2-5-single-mode-machine', 60, 'IEC 61753-1 grade 1, from memory'],
    ['apc-1-25-single-mode-machine', 60, 'IEC 61753-1 grade 1, from memory'],
    ['pc-2-5-multimode-hand', 20, 'TIA-568-C.3, from memory'],
    ['pc-1-25-multimode-machine', 20, 'TIA-568-C.3, from memory'],
    ['flat-terminus-multimode-hand', 30, 'MIL-PRF-29504B 3.5.3: multimode reflectance -30 dB'],
  ])('%s: return loss is %d dB at least (%s)', (id, lowestDb) => {
    for (const { lowest } of limits(id, 'return loss')) expect(lowest).toBe(lowestDb);
  });

  test.each(['apc-2-5-single-mode-machine', 'apc-1-25-single-mode-machine'])(
    '%s: geometry of APC (IEC 61755-3-2, from memory)',
    (id) => {
      const of = (quantity: string) => limits(id, quantity).map(({ lowest, highest }) => [lowest, highest])[0];
      expect(of('polish angle')).toEqual([7.8, 8.2]);
      expect(of('key error')).toEqual([-0.5, 0.5]);
      expect(of('radius of curvature')).toEqual([5, 12]);
      expect(of('apex offset')).toEqual([0, 50]);
      expect(of('fibre height')).toEqual([-100, 100]);
    },
  );

  test.each(ids)('%s: stripped fibre is looked at with 10x (MIL-PRF-49291D 4.7.2.4)', (id) => {
    expect(step(shipped(id), 'look-glass', 'inspect').magnification).toBe(10);
  });

  test.each(ids)(
    '%s: single-mode faces at 200x to 400x, multimode at 100x to 200x (common practice, no source)',
    (id) => {
      const recipe = shipped(id);
      const [low, high] = recipe.fits.fibreKind === 'single-mode' ? [200, 400] : [100, 200];
      for (const name of ['inspect-film', 'inspect-face']) {
        const { magnification } = step(recipe, name, 'inspect');
        expect(magnification).toBeGreaterThanOrEqual(low);
        expect(magnification).toBeLessThanOrEqual(high);
      }
    },
  );
});
