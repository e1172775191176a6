import { type Broken } from './broken.ts';
import { upc } from './shipped.ts';

/** Recipes whose fibre, strip profile or adhesive cannot be. */
export const brokenMaterials: readonly Broken[] = [
  {
    what: 'a core of 50 µm called single-mode',
    from: upc,
    change: (recipe) => (recipe.fits.coresUm = [50]),
    problems: ['core-kind /fits/coresUm/0'],
  },
  {
    what: 'a core of 9 µm called multimode',
    from: upc,
    change: (recipe) => (recipe.fits.fibreKind = 'multimode'),
    problems: ['core-kind /fits/coresUm/0'],
  },
  {
    what: 'the same core twice',
    from: upc,
    change: (recipe) => (recipe.fits.coresUm = [9, 9]),
    problems: ['listed-twice /fits/coresUm/1'],
  },
  {
    what: 'a buffer of 3 mm in a jacket of 2 mm',
    from: upc,
    change: (recipe) => (recipe.fits.bufferUm = 3000),
    problems: ['layer-order /fits/cableJacketsMm'],
  },
  {
    what: 'a buffer thinner than the coating',
    from: upc,
    change: (recipe) => (recipe.fits.bufferUm = 249),
    problems: ['layer-order /fits/bufferUm'],
  },
  {
    what: 'a coating as thin as the glass',
    from: upc,
    change: (recipe) => (recipe.fits.coatingUm = 125),
    problems: ['layer-order /fits/coatingUm'],
  },
  {
    what: 'the widest bore below the narrowest',
    from: upc,
    change: (recipe) => (recipe.fits.boreMaxUm = 124),
    problems: ['bore-order /fits/boreMaxUm'],
  },
  {
    what: 'a bore that the glass does not enter',
    from: upc,
    change: (recipe) => (recipe.fits.boreMinUm = 124),
    problems: ['bore-small /fits/boreMinUm'],
  },
  {
    what: 'a multimode bore on single-mode fibre',
    from: upc,
    change: (recipe) => (recipe.fits.boreMaxUm = 128),
    problems: ['bore-large /fits/boreMaxUm'],
  },
  {
    what: 'a tolerance as large as the length',
    from: upc,
    change: (recipe) => (recipe.strip.strengthMemberMm.toleranceMm = 6),
    problems: ['strip-tolerance /strip/strengthMemberMm/toleranceMm'],
  },
  {
    what: 'bare glass and strength member longer than the jacket taken off',
    from: upc,
    change: (recipe) => (recipe.strip.jacketOffMm.nominalMm = 23.9),
    problems: ['strip-nesting /strip/jacketOffMm'],
  },
  {
    what: 'bare glass of 1.6 mm where 16 mm was meant',
    from: upc,
    change: (recipe) => (recipe.strip.bareGlassMm.nominalMm = 1.6),
    problems: ['strip-reach /strip/bareGlassMm'],
  },
  {
    what: 'a cut that costs less cable than was stripped',
    from: upc,
    change: (recipe) => (recipe.retermination.cableMm = 29),
    problems: ['retermination-length /retermination/cableMm'],
  },
  {
    what: 'a highest temperature below the lowest',
    from: upc,
    change: ({ adhesive }) => {
      adhesive.highestC = 80;
      adhesive.curePairs = [{ temperatureC: 100, minutes: 20 }];
    },
    problems: [
      'adhesive-range /adhesive/highestC',
      'cure-pair-range /adhesive/curePairs/0/temperatureC',
      'cure-set-point /steps/10/setPointC',
    ],
  },
  {
    what: 'a pair below the lowest temperature',
    from: upc,
    change: ({ adhesive }) => (adhesive.lowestC = 90),
    problems: ['cure-pair-range /adhesive/curePairs/0/temperatureC'],
  },
  {
    what: 'a pair above the highest temperature',
    from: upc,
    change: ({ adhesive }) => (adhesive.highestC = 110),
    problems: ['cure-pair-range /adhesive/curePairs/2/temperatureC'],
  },
  {
    what: 'pairs out of order',
    from: upc,
    change: ({ adhesive }) => adhesive.curePairs.reverse(),
    problems: [
      'cure-pair-order /adhesive/curePairs/1/temperatureC',
      'cure-pair-order /adhesive/curePairs/2/temperatureC',
    ],
  },
  {
    what: 'a hotter pair that takes longer',
    from: upc,
    change: ({ adhesive }) => {
      adhesive.curePairsComputedFrom = null;
      adhesive.curePairs = [
        { temperatureC: 85, minutes: 45 },
        { temperatureC: 100, minutes: 45 },
      ];
    },
    problems: ['cure-pair-fall /adhesive/curePairs/1/minutes'],
  },
  {
    what: 'a computed pair that its origin does not give',
    from: upc,
    change: ({ adhesive }) => (adhesive.curePairs = [{ temperatureC: 120, minutes: 8 }]),
    problems: ['cure-pair-computed /adhesive/curePairs/0/minutes'],
  },
  {
    what: 'a longest dose of 1',
    from: upc,
    change: ({ adhesive }) => (adhesive.longestDose = 1),
    problems: ['longest-dose /adhesive/longestDose'],
  },
  {
    what: 'handling at 400 °C where 40 was meant',
    from: upc,
    change: ({ adhesive }) => (adhesive.handlingC = 400),
    problems: ['handling-hot /adhesive/handlingC'],
  },
];
