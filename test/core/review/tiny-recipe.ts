import type { TakenRecipe } from '../../../src/core/batch/types.ts';
import type { Recipe, Step } from '../../../src/core/recipe/schema.ts';

/** Six steps, one of each kind that a review treats differently. The figures are invented. */

const base = (id: string) => ({
  id,
  texts: { en: { title: id, label: id, done: id, notes: [] } },
  goes: 'batch by batch' as const,
  // Long enough that no gap in these tests is capped at three standard times.
  standard: { setupS: 600, eachS: 60 },
  cautions: [],
  sendsBack: [],
});

const steps: Step[] = [
  { ...base('mix'), kind: 'mix', limits: 'fill' },
  { ...base('fill'), kind: 'do', picture: 'fill' },
  { ...base('cure'), kind: 'cure', setPointC: 100 },
  { ...base('cool'), kind: 'wait', atLeastS: 300 },
  {
    ...base('polish'),
    kind: 'polish',
    filmUm: 3,
    filmMaterial: 'aluminium oxide',
    pad: { kind: 'glass' },
    forceMinN: 0,
    forceMaxN: 2,
    until: { kind: 'time', aimS: 240, toleranceS: 20 },
    liquid: 'water',
    usesPerSheet: 5,
  },
  { ...base('inspect'), kind: 'inspect', criterion: 'none', magnification: 200 },
];

export function tinyRecipe(id: string): Recipe {
  return {
    format: 1,
    id,
    revision: 'A',
    status: 'starting values',
    texts: { en: { name: id, summary: id } },
    fits: {
      ferruleMm: 2.5,
      ferruleMaterial: 'zirconia',
      boreMinUm: 125,
      boreMaxUm: 126,
      fibreKind: 'single-mode',
      coresUm: [9],
      claddingUm: 125,
      coatingUm: 250,
      bufferUm: 900,
      cableJacketsMm: [3],
      jacketColour: 'yellow',
      polish: 'UPC',
      angleDeg: 0,
      terminus: null,
    },
    strip: {
      jacketOffMm: { nominalMm: 30, toleranceMm: 1 },
      strengthMemberMm: { nominalMm: 6, toleranceMm: 1 },
      bareGlassMm: { nominalMm: 12, toleranceMm: 1 },
    },
    adhesive: {
      name: 'invented',
      workingLifeMinutes: 60,
      workingLifeAtC: 23,
      workingLifeActivationKJPerMol: null,
      curePairs: [{ temperatureC: 100, minutes: 30 }],
      curePairsComputedFrom: null,
      lowestC: 60,
      highestC: 150,
      longestDose: 3,
      handlingC: 40,
    },
    retermination: { cableMm: 30, parts: ['connector'] },
    repolishLimit: 2,
    defects: ['scratch', 'crack', 'void'].map((code) => ({ code, texts: { en: code } })),
    materials: [],
    tools: [],
    steps,
    basis: [],
  };
}

/** A stand-in for a SHA-256. */
export const hashOf = (id: string): string => `hash-of-${id}`;

export function takenRecipes(ids: readonly string[]): Record<string, TakenRecipe> {
  const taken = { log: 'log-a', bench: 0, wall: 0 };
  return Object.fromEntries(ids.map((id) => [hashOf(id), { hash: hashOf(id), recipe: tinyRecipe(id), taken }]));
}
