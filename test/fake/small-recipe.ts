import type { Recipe, Step } from '../../src/core/recipe/schema.ts';

const texts = (title: string, label: string, done: string): Step['texts'] => ({
  en: { title, label, done, notes: [] },
});

const base = {
  goes: 'batch by batch' as const,
  standard: { setupS: 30, eachS: 10 },
  cautions: [],
  sendsBack: [],
};

/**
 * A recipe as short as a whole termination can be, for tests of batch and clock: strip, mix, fill, cure of 20 min at
 * 100 °C, cool-down of 10 min, a film of 60 ± 5 s, inspect, measure.
 */
export const smallRecipe: Recipe = {
  format: 1,
  id: 'small',
  revision: 'A',
  status: 'starting values',
  texts: { en: { name: 'Small', summary: 'For tests.' } },
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
    jacketOffMm: { nominalMm: 30, toleranceMm: 0.5 },
    strengthMemberMm: { nominalMm: 6, toleranceMm: 1 },
    bareGlassMm: { nominalMm: 16, toleranceMm: 0.5 },
  },
  adhesive: {
    name: 'Two-part epoxy',
    workingLifeMinutes: 60,
    workingLifeAtC: 23,
    workingLifeActivationKJPerMol: null,
    curePairs: [
      { temperatureC: 100, minutes: 20 },
      { temperatureC: 120, minutes: 7.5 },
    ],
    curePairsComputedFrom: null,
    lowestC: 85,
    highestC: 130,
    longestDose: 3,
    handlingC: 40,
  },
  retermination: { cableMm: 40, parts: ['connector'] },
  repolishLimit: 2,
  defects: [
    { code: 'scratch', texts: { en: 'Scratch' } },
    { code: 'crack', texts: { en: 'Crack' } },
    { code: 'high-loss', texts: { en: 'High loss' } },
  ],
  materials: [],
  tools: [],
  steps: [
    { ...base, kind: 'do', id: 'strip', picture: 'strip', texts: texts('Strip to length', 'Strip', 'stripped') },
    { ...base, kind: 'mix', id: 'mix', limits: 'fill', texts: texts('Mix the adhesive', 'Mix', 'mixed') },
    { ...base, kind: 'do', id: 'fill', picture: 'fill', texts: texts('Fill and insert', 'Fill', 'filled') },
    {
      ...base,
      kind: 'cure',
      id: 'cure',
      goes: 'load by load',
      loadSize: 24,
      setPointC: 100,
      texts: texts('Cure', 'Cure', 'in the oven'),
    },
    { ...base, kind: 'wait', id: 'cool', atLeastS: 600, texts: texts('Cool down', 'Cool', 'cooled') },
    {
      ...base,
      kind: 'polish',
      id: 'film-1',
      goes: 'load by load',
      loadSize: 12,
      filmUm: 1,
      filmMaterial: 'diamond',
      pad: { kind: 'rubber', hardnessMinShoreA: 75, hardnessMaxShoreA: 75 },
      forceMinN: 1,
      forceMaxN: 2,
      until: { kind: 'time', aimS: 60, toleranceS: 5 },
      liquid: 'water',
      usesPerSheet: 20,
      texts: texts('Film 1 µm', '1 µm', 'polished'),
    },
    {
      ...base,
      kind: 'inspect',
      id: 'inspect',
      criterion: 'single-mode',
      magnification: 200,
      texts: texts('Inspect', 'Inspect', 'inspected'),
      sendsBack: [
        { defect: 'scratch', to: 'film-1' },
        { defect: 'crack', to: 'strip' },
      ],
    },
    {
      ...base,
      kind: 'measure',
      id: 'measure',
      readings: [{ quantity: 'loss', unit: 'dB', highest: 0.5 }],
      texts: texts('Measure', 'Loss', 'measured'),
      sendsBack: [{ defect: 'high-loss', to: 'film-1' }],
    },
  ],
  basis: [],
};
