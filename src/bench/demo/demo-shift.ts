import type { Command, NamedConnector } from '../../core/command/commands.ts';
import { cureOf } from '../../core/cure/cure.ts';
import { workingLifeSeconds } from '../../core/cure/working-life.ts';
import type { ShippedRecipe } from '../shipped-recipes.ts';
import { Course, spanMs, timedStep, type Planned } from './course.ts';

/** How long the shift has run when the demo opens: a tablet that shows 14:40 began at 7:00. */
export const shiftSoFarMs = (7 * 60 + 40) * 60_000;
export const demoShift = 'Early';

const minuteMs = 60_000;
const readingC = 98;

export interface DemoOptions {
  readonly recipes: readonly ShippedRecipe[];
  readonly randomId: () => string;
  /** Hours of the shift on the tablet's wall clock, HH:MM. */
  readonly hours: { readonly from: string; readonly to: string };
}

/**
 * An invented shift as commands in the order of their time, in ms before now: a batch that was closed in the morning,
 * and four at work, whose clocks all run at once when the demo opens.
 */
export function demoShiftPlan({ recipes, randomId, hours }: DemoOptions): Planned[] {
  const oven = randomId();
  const block = randomId();
  const made = (id: string, tag: number, workOrder: string, connectors: readonly NamedConnector[], station: string) =>
    new Course({
      batch: randomId(),
      tag,
      workOrder,
      recipe: recipeOf(recipes, id),
      connectors,
      oven: station,
      randomId,
    });
  const plan = [
    ...bench(oven, block, hours),
    ...morning(made('pc-2-5-multimode-hand', 1, 'WO 7301', unnamed(6), oven)),
    ...onFinalFilm(made('upc-2-5-single-mode-machine', 2, 'WO 7304', ends('7304', 6), oven)),
    ...cureDone(made('upc-1-25-single-mode-machine', 9, 'WO 7305', unnamed(12), oven)),
    ...curing(made('pc-1-25-multimode-machine', 12, 'WO 7308', unnamed(12), block), block),
    ...filling(made('apc-1-25-single-mode-machine', 3, 'WO 7309', unnamed(24), block)),
  ];
  return plan.sort((a, b) => a.atMs - b.atMs);
}

const unnamed = (count: number): NamedConnector[] => Array.from({ length: count }, () => ({}));

/** Both ends of so many cords. */
const ends = (order: string, cords: number): NamedConnector[] =>
  Array.from({ length: cords }, (_, index) => `${order}-${String(index + 1).padStart(2, '0')}`).flatMap((cord) => [
    { serial: `${cord}A`, end: 'A' as const },
    { serial: `${cord}B`, end: 'B' as const },
  ]);

function recipeOf(recipes: readonly ShippedRecipe[], id: string): ShippedRecipe {
  const found = recipes.find(({ recipe }) => recipe.id === id);
  if (!found) throw new RangeError(`no recipe ${id}`);
  return found;
}

function bench(oven: string, block: string, { from, to }: DemoOptions['hours']): Planned[] {
  const shifts = [{ name: demoShift, from, to }];
  const at = (minutesAgo: number, command: Command): Planned => ({ atMs: -minutesAgo * minuteMs, command });
  return [
    at(459.5, { type: 'set bench', tablet: 'Demo bench', operators: ['AB', 'KT'], shifts }),
    at(459, { type: 'sign on', operator: 'AB', shift: demoShift }),
    at(456, { type: 'set oven', oven, name: 'Oven 1', setPointC: 100, warmUpS: 480 }),
    at(455, { type: 'set oven', oven: block, name: 'Heat block 2', setPointC: 100, warmUpS: null }),
    at(334, { type: 'read oven', oven, temperatureC: 100 }),
    at(225, { type: 'sign on', operator: 'KT', shift: demoShift }),
  ];
}

/** Closed: one connector was polished again for a scratch, one was scrapped with a crack. */
function morning(course: Course): Planned[] {
  const { batch } = course;
  course
    .through('ready', 'crimp')
    .lateCure('cure', 95, 100)
    .through('cool', 'clean-face')
    .through('inspect-face', 'inspect-face', [1, 2])
    .give({ type: 'send back', batch, connectors: [3], to: 'film-3', defect: 'scratch' }, 70)
    .through('inspect-face', 'inspect-face', [4])
    .give({ type: 'scrap', batch, connectors: [5], defect: 'crack' }, 70)
    .through('inspect-face', 'inspect-face', [6])
    .through('film-3', 'inspect-face', [3])
    .through('measure', 'release', [1, 2, 3, 4, 6])
    .give({ type: 'close batch', batch });
  return course.beginningAt(75 * minuteMs - shiftSoFarMs);
}

/** The final film runs for another 27 s; one connector went back to a coarser film. */
function onFinalFilm(course: Course): Planned[] {
  const { batch, all } = course;
  course
    .through('ready', 'film-1')
    .through(
      'inspect-film',
      'inspect-film',
      all.filter((number) => number !== 4),
    )
    .give({ type: 'send back', batch, connectors: [4], to: 'film-3', defect: 'scratch' }, 40)
    .begin(
      'film-final',
      all.filter((number) => number !== 4),
    );
  return course.endingAt(27_000 - spanMs(course.recipe, timedStep(course.recipe, 'film-final')));
}

/** The cure was done 40 s ago; somebody has seen it, and the tray waits. */
function cureDone(course: Course): Planned[] {
  return course.through('ready', 'crimp').seenCure('cure', 12).endingAt(-28_000);
}

/** Two fifths of the dose, on a heat block that was read a little cold. */
function curing(course: Course, block: string): Planned[] {
  course.through('ready', 'crimp').begin('cure');
  const readMs = -4 * minuteMs;
  const read: Command = { type: 'read oven', oven: block, temperatureC: readingC };
  return [...course.endingAt(startOfCure(course, 0.41, readMs)), { atMs: readMs, command: read }];
}

/** The first half is filled and in; the mix lasts another 36 min for the second. */
function filling(course: Course): Planned[] {
  course.through('ready', 'mix');
  const mixedMs = course.planned.at(-1)?.atMs ?? 0;
  course.through('fill', 'insert', course.all.slice(0, 12));
  const sinceMixedMs = (course.planned.at(-1)?.atMs ?? 0) - mixedMs;
  const lifeMs = workingLifeSeconds(course.recipe.adhesive, 22) * 1000;
  return course.endingAt(36 * minuteMs - lifeMs + sinceMixedMs);
}

/** When a cure must have begun to have this dose now, the heat block having been read since; in ms before now. */
function startOfCure(course: Course, dose: number, readMs: number): number {
  const step = timedStep(course.recipe, 'cure');
  if (step.kind !== 'cure') throw new RangeError('no cure');
  const at = (ms: number) => ({ log: '', bench: ms, wall: ms });
  const oven = [{ kind: 'read', temperatureC: readingC, at: at(readMs) } as const];
  const { setPointC } = step;
  const { adhesive } = course.recipe;
  const doseFrom = (fromMs: number) => cureOf({ from: at(fromMs), setPointC, adhesive, oven }).doseAt(-fromMs);
  let [early, late] = [-6 * 60 * minuteMs, readMs];
  while (late - early > 1) {
    const middle = Math.floor((early + late) / 2);
    if (doseFrom(middle) >= dose) early = middle;
    else late = middle;
  }
  return early;
}
