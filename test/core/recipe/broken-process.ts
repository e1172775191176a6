import { type Broken } from './broken.ts';
import { apc, place, step, upc } from './shipped.ts';

/** Recipes whose steps before polishing, or whose order, cannot be. */
export const brokenProcess: readonly Broken[] = [
  {
    what: 'an id for two steps',
    from: upc,
    change: (recipe) => (step(recipe, 'trim', 'do').id = 'strip'),
    problems: ['step-twice /steps/3/id'],
  },
  {
    what: 'a code for two defects',
    from: upc,
    change: (recipe) => recipe.defects.push({ code: 'crack', texts: { en: 'Crack again' } }),
    problems: ['defect-twice /defects/27/code'],
  },
  {
    what: 'a caution twice at a step',
    from: upc,
    change: (recipe) => step(recipe, 'cool', 'wait').cautions.push('heat'),
    problems: ['listed-twice /steps/11/cautions/1'],
  },
  {
    what: 'an oven hotter than the adhesive bears',
    from: upc,
    change: (recipe) => (step(recipe, 'cure', 'cure').setPointC = 126),
    problems: ['cure-set-point /steps/10/setPointC'],
  },
  {
    what: 'an oven too cold to count',
    from: upc,
    change: (recipe) => (step(recipe, 'cure', 'cure').setPointC = 84),
    problems: ['cure-set-point /steps/10/setPointC'],
  },
  {
    what: 'a hot tray into hands',
    from: upc,
    change: (recipe) => {
      recipe.steps.splice(place(recipe, 'cool'), 1);
      recipe.basis = recipe.basis.filter(({ path }) => !path.startsWith('/steps/'));
      recipe.status = 'qualified by the shop';
    },
    problems: ['cool-down-missing /steps/11'],
  },
  {
    what: 'a mix that limits nothing',
    from: upc,
    change: (recipe) => (step(recipe, 'mix', 'mix').limits = 'inject'),
    problems: ['mix-limit-unknown /steps/6/limits'],
  },
  {
    what: 'a mix that limits a step before it',
    from: upc,
    change: (recipe) => (step(recipe, 'mix', 'mix').limits = 'strip'),
    problems: ['mix-limit-earlier /steps/6/limits'],
  },
  {
    what: 'a mix that limits the cure itself',
    from: upc,
    change: (recipe) => (step(recipe, 'mix', 'mix').limits = 'cure'),
    problems: ['mix-limit-cured /steps/6/limits'],
  },
  {
    what: 'a working life too short for a load',
    from: upc,
    change: (recipe) => (recipe.adhesive.workingLifeMinutes = 15),
    problems: ['working-life-short /adhesive/workingLifeMinutes'],
  },
  {
    what: 'a load without a size',
    from: upc,
    change: (recipe) => delete step(recipe, 'crimp', 'do').loadSize,
    problems: ['load-size-missing /steps/9/loadSize'],
  },
  {
    what: 'a size without a load',
    from: upc,
    change: (recipe) => (step(recipe, 'strip', 'do').loadSize = 12),
    problems: ['load-size-unexpected /steps/2/loadSize'],
  },
  {
    what: 'a way back for an unknown defect',
    from: upc,
    change: (recipe) => step(recipe, 'strip', 'do').sendsBack.push({ defect: 'bad-luck', to: 'prepare' }),
    problems: ['rework-defect-unknown /steps/2/sendsBack/2/defect'],
  },
  {
    what: 'two ways back for one finding',
    from: upc,
    change: (recipe) => step(recipe, 'inspect-face', 'inspect').sendsBack.push({ defect: 'scratch', to: 'film-3' }),
    problems: ['rework-twice /steps/21/sendsBack/11/defect'],
  },
  {
    what: 'a way back to no step',
    from: upc,
    change: (recipe) => step(recipe, 'strip', 'do').sendsBack.push({ defect: 'dropped', to: 'home' }),
    problems: ['rework-target-unknown /steps/2/sendsBack/2/to'],
  },
  {
    what: 'a way back that goes forward',
    from: upc,
    change: (recipe) => step(recipe, 'strip', 'do').sendsBack.push({ defect: 'dropped', to: 'trim' }),
    problems: ['rework-target-later /steps/2/sendsBack/2/to'],
  },
  {
    what: 'a way back to the same step',
    from: upc,
    change: (recipe) => step(recipe, 'strip', 'do').sendsBack.push({ defect: 'dropped', to: 'strip' }),
    problems: ['rework-target-later /steps/2/sendsBack/2/to'],
  },
  {
    what: 'a crack polished out',
    from: upc,
    change: (recipe) => (step(recipe, 'film-9', 'polish').sendsBack = [{ defect: 'crack', to: 'film-15' }]),
    problems: ['rework-crack /steps/15/sendsBack/0/to'],
  },
  {
    what: 'a way back into a mix that was left',
    from: upc,
    change: (recipe) => (step(recipe, 'film-9', 'polish').sendsBack = [{ defect: 'uncured', to: 'insert' }]),
    problems: ['rework-without-mix /steps/15/sendsBack/0/to'],
  },
  {
    what: 'an end without a check',
    from: upc,
    change: (recipe) => {
      recipe.steps.splice(place(recipe, 'inspect-face'));
      recipe.basis = recipe.basis.filter(({ path }) => !/^\/steps\/2\d/.test(path));
    },
    problems: ['last-step-check /steps/20/kind'],
  },
  {
    what: 'a basis for nothing',
    from: apc,
    change: (recipe) => recipe.basis.push({ path: '/steps/99', rests: 'from memory' }),
    problems: ['basis-path /basis/25/path'],
  },
  {
    what: 'a basis that reaches into a prototype',
    from: apc,
    change: (recipe) => recipe.basis.push({ path: '/steps/length', rests: 'from memory' }),
    problems: ['basis-path /basis/25/path'],
  },
  {
    what: 'something published nowhere',
    from: apc,
    change: (recipe) => recipe.basis.push({ path: '/texts', rests: 'published' }),
    problems: ['basis-source /basis/25/source'],
  },
  {
    what: 'figures that rest on nothing',
    from: upc,
    change: (recipe) => (recipe.basis = recipe.basis.filter(({ path }) => path !== '/strip')),
    problems: ['basis-missing /strip'],
  },
  {
    what: 'a limit that rests on the word for all steps',
    from: upc,
    change: (recipe) => (recipe.basis = recipe.basis.filter(({ path }) => path !== '/steps/22/readings/3')),
    problems: ['basis-missing /steps/22/readings/3'],
  },
  {
    what: 'computed pairs passed off as practice',
    from: upc,
    change: (recipe) => (recipe.basis = recipe.basis.filter(({ path }) => path !== '/adhesive/curePairs')),
    problems: ['basis-missing /adhesive/curePairs'],
  },
];
