import { groupsOf, type Group } from '../../../src/core/batch/groups.ts';
import type { Command } from '../../../src/core/command/commands.ts';
import { isTimed } from '../../../src/core/recipe/read.ts';
import type { Recipe, Step } from '../../../src/core/recipe/schema.ts';
import { Script } from '../../fake/script.ts';

/** One entry of a batch's course: when it came, in ms since the batch was opened, and what it said. */
export interface CourseEntry {
  readonly atMs: number;
  readonly isBenchWide: boolean;
  readonly by: string;
  readonly type: string;
  /** JSON text in which `idMark` stands for what tells this batch's ids from others. */
  readonly data: string;
}

/** Stands in batch, load and mix ids, to be replaced. It needs no escaping in JSON. */
export const idMark = '~id~';
export const courseBatch = `batch-${idMark}`;

/**
 * A batch from opening to closing as technicians work: the first group that can go on does, after about its standard
 * time; some connectors fail a check and are sent back, a few are scrapped. Every entry was decided by the app's own rules.
 */
export function courseOf(recipe: Recipe, connectors: number, chance: () => number): CourseEntry[] {
  const script = new Script({ recipes: [recipe] });
  script.open(courseBatch, connectors, recipe);
  const begun = script.wall;
  const skipped = script.entries.findIndex(({ type }) => type === 'batchOpened');
  for (let turn = 0; turn < 2000; turn += 1) {
    const batch = script.batch(courseBatch);
    if (batch.closed) break;
    const [group] = groupsOf(batch);
    const step = group ? recipe.steps[group.step] : undefined;
    if (!group || !step) {
      script.wait(60).do({ type: 'close batch', batch: courseBatch });
      continue;
    }
    const taken = takenAtOnce(group, step);
    script.wait(durationS(group, step, taken.length, chance));
    script.do(next(group, step, taken, turn, chance));
  }
  if (!script.batch(courseBatch).closed) throw new Error(`a batch of ${recipe.id} did not come to its end`);
  return script.entries.slice(skipped).map((entry) => ({
    atMs: entry.wall - begun,
    isBenchWide: entry.batch === 'bench',
    by: entry.by,
    type: entry.type,
    data: JSON.stringify(entry.data),
  }));
}

function takenAtOnce(group: Group, step: Step): number[] {
  const numbers = group.connectors.map(({ number }) => number);
  if (step.goes === 'connector by connector') return numbers.slice(0, 1);
  return step.loadSize === undefined ? numbers : numbers.slice(0, step.loadSize);
}

function durationS(group: Group, step: Step, connectors: number, chance: () => number): number {
  const standardS = Math.round((step.standard.setupS + step.standard.eachS * connectors) * (0.7 + 0.6 * chance()));
  if (group.at === 'step') return Math.max(1, standardS);
  if (step.kind === 'wait') return step.atLeastS + 30;
  if (step.kind === 'polish' && step.until.kind === 'time') return step.until.aimS;
  return 60;
}

function next(group: Group, step: Step, connectors: readonly number[], turn: number, chance: () => number): Command {
  const on = { batch: courseBatch, connectors };
  // A reason is given throughout: the longest time of a cure is not reckoned here.
  if (group.at === 'load') {
    const nextLoad = `next-${turn}-${idMark}`;
    return { type: 'end load', batch: courseBatch, load: group.load.id, nextLoad, reason: 'as measured by the oven' };
  }
  if (step.kind === 'mix')
    return { type: 'mix adhesive', ...on, mix: `mix-${turn}-${idMark}`, lot: 'A-2291', roomC: 22 };
  if (isTimed(step)) return { type: 'start load', ...on, step: step.id, load: `load-${turn}-${idMark}`, station: '' };
  const fault = step.sendsBack[Math.floor(chance() * step.sendsBack.length)];
  if (fault && connectors[0] !== undefined && chance() < 0.03) {
    const failed = { batch: courseBatch, connectors: [connectors[0]], defect: fault.defect };
    const isLost = chance() < 0.3;
    return isLost ? { type: 'scrap', ...failed } : { type: 'send back', ...failed, to: fault.to };
  }
  if (step.kind === 'inspect' || step.kind === 'measure') return { type: 'pass', ...on, step: step.id };
  return { type: 'finish step', ...on, step: step.id, overrunReason: 'checked, still thin' };
}
