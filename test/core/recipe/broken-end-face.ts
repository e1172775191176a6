import { type Broken } from './broken.ts';
import { apc, place, step, upc } from './shipped.ts';

/** Recipes whose polish, angle or readings cannot be. */
export const brokenEndFace: readonly Broken[] = [
  {
    what: 'a film coarser than the one before',
    from: upc,
    change: (recipe) => (step(recipe, 'film-3', 'polish').filmUm = 10),
    problems: ['film-coarser /steps/16/filmUm'],
  },
  {
    what: 'a film coarser than the polish in air',
    from: upc,
    change: (recipe) => (step(recipe, 'air', 'polish').filmUm = 12),
    problems: ['film-coarser /steps/14/filmUm'],
  },
  {
    what: 'a film repeated in the middle',
    from: upc,
    change: (recipe) => (step(recipe, 'film-3', 'polish').filmUm = 9),
    problems: ['film-repeated /steps/16/filmUm'],
  },
  {
    what: 'a final film that falls back to a coarser one',
    from: upc,
    change: (recipe) => (step(recipe, 'film-final', 'polish').filmUm = 1.5),
    problems: ['film-coarser /steps/19/filmUm'],
  },
  {
    what: 'a highest force below the lowest',
    from: upc,
    change: (recipe) => (step(recipe, 'film-3', 'polish').forceMaxN = 1.9),
    problems: ['film-force /steps/16/forceMaxN'],
  },
  {
    what: 'a pad harder than the scale',
    from: upc,
    change: (recipe) =>
      (step(recipe, 'film-3', 'polish').pad = { kind: 'rubber', hardnessMinShoreA: 75, hardnessMaxShoreA: 101 }),
    problems: ['film-pad /steps/16/pad/hardnessMaxShoreA'],
  },
  {
    what: 'a pad with its limits crossed',
    from: upc,
    change: (recipe) =>
      (step(recipe, 'film-3', 'polish').pad = { kind: 'rubber', hardnessMinShoreA: 80, hardnessMaxShoreA: 75 }),
    problems: ['film-pad /steps/16/pad/hardnessMaxShoreA'],
  },
  {
    what: 'a tolerance as long as the film',
    from: upc,
    change: (recipe) => (step(recipe, 'film-3', 'polish').until = { kind: 'time', aimS: 60, toleranceS: 60 }),
    problems: ['film-time /steps/16/until/toleranceS'],
  },
  {
    what: 'a wet polish in air',
    from: upc,
    change: (recipe) => (step(recipe, 'air', 'polish').liquid = 'water'),
    problems: ['film-air-wet /steps/13/liquid'],
  },
  {
    what: 'APC without its angle',
    from: apc,
    change: (recipe) => (recipe.fits.angleDeg = 0),
    problems: ['angle-missing /fits/angleDeg', 'angle-limits /steps/22/readings/0'],
  },
  {
    what: 'an angle on UPC',
    from: upc,
    change: (recipe) => (recipe.fits.angleDeg = 8),
    problems: ['angle-unexpected /fits/angleDeg'],
  },
  {
    what: 'APC whose angle nobody checks',
    from: apc,
    change: (recipe) => step(recipe, 'geometry', 'measure').readings.shift(),
    problems: ['angle-unchecked /steps'],
  },
  {
    what: 'APC checked before its last film',
    from: apc,
    change: (recipe) => {
      const [geometry] = recipe.steps.splice(place(recipe, 'geometry'), 1);
      if (geometry) recipe.steps.splice(place(recipe, 'inspect-film'), 0, geometry);
      recipe.basis = recipe.basis.filter(({ path }) => !path.startsWith('/steps/'));
      recipe.status = 'qualified by the shop';
    },
    problems: ['angle-unchecked /steps', 'rework-target-later /steps/18/sendsBack/5/to'],
  },
  {
    what: 'limits that leave the angle outside',
    from: apc,
    change: (recipe) => (recipe.fits.angleDeg = 9),
    problems: ['angle-limits /steps/22/readings/0'],
  },
  {
    what: 'a measure step that measures nothing',
    from: upc,
    change: (recipe) => {
      step(recipe, 'measure', 'measure').readings = [];
      recipe.basis = recipe.basis.filter(({ path }) => !path.includes('/readings'));
    },
    problems: ['reading-none /steps/22/readings'],
  },
  {
    what: 'a loss in mm',
    from: upc,
    change: (recipe) => (reading(recipe, 0).unit = 'mm'),
    problems: ['reading-unit /steps/22/readings/0/unit'],
  },
  {
    what: 'a loss at no wavelength',
    from: upc,
    change: (recipe) => delete reading(recipe, 0).wavelengthNm,
    problems: ['reading-wavelength /steps/22/readings/0/wavelengthNm'],
  },
  {
    what: 'an angle at a wavelength',
    from: apc,
    change: (recipe) => {
      const angle = step(recipe, 'geometry', 'measure').readings[0];
      if (angle) angle.wavelengthNm = 1310;
    },
    problems: ['reading-wavelength /steps/22/readings/0/wavelengthNm'],
  },
  {
    what: 'limits of a reading crossed',
    from: upc,
    change: (recipe) => (reading(recipe, 0).lowest = 1),
    problems: ['reading-order /steps/22/readings/0/highest'],
  },
  {
    what: 'return loss with the sign of reflectance',
    from: upc,
    change: (recipe) => (reading(recipe, 2).lowest = -45),
    problems: ['reading-sign /steps/22/readings/2/lowest'],
  },
];

function reading(recipe: ReturnType<typeof upc>, index: number) {
  const found = step(recipe, 'measure', 'measure').readings[index];
  if (!found) throw new Error(`no reading ${index}`);
  return found;
}
