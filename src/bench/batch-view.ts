import { groupKey, groupsOf, type Group } from '../core/batch/groups.ts';
import type { Batch } from '../core/batch/types.ts';
import type { Step } from '../core/recipe/schema.ts';
import { attention, compareAttention, type Attention } from '../core/timer/order.ts';
import type { Reading } from '../core/timer/reading.ts';

/** A group of a batch with the clock that presses it most. */
export interface GroupView {
  readonly key: string;
  readonly group: Group;
  readonly step: Step;
  readonly reading: Reading | null;
  readonly attention: Attention;
  /** The connectors that one tap of the main action takes. */
  readonly take: readonly number[];
}

/** The groups of a batch, the most urgent first: what its row and its page show, and what the main action is for. */
export function groupViews(batch: Batch, readings: readonly Reading[]): GroupView[] {
  const views = groupsOf(batch).flatMap((group): GroupView[] => {
    const step = batch.recipe.steps[group.step];
    if (!step) return [];
    const reading = readingOf(group, readings);
    return [
      {
        key: groupKey(group),
        group,
        step,
        reading,
        attention: attention(reading ? [reading] : [], group.at === 'step'),
        take: takenAtOnce(group, step),
      },
    ];
  });
  return views.sort((a, b) => compareAttention(a.attention, b.attention) || a.group.step - b.group.step);
}

function readingOf(group: Group, readings: readonly Reading[]): Reading | null {
  const own = readings.filter(({ clock: { about } }) => {
    if (group.at === 'load') return about.type !== 'working life' && about.load === group.load.id;
    return about.type === 'working life' && group.connectors.some(({ mix }) => mix === about.mix);
  });
  return own[0] ?? null;
}

function takenAtOnce(group: Group, step: Step): number[] {
  const numbers = group.connectors.map(({ number }) => number);
  if (group.at === 'load') return numbers;
  if (step.goes === 'connector by connector') return numbers.slice(0, 1);
  return step.loadSize === undefined ? numbers : numbers.slice(0, step.loadSize);
}

/** Open batches in the order in which they need a person. */
export function byNeed(
  batches: readonly Batch[],
  readings: readonly Reading[],
): { batch: Batch; groups: GroupView[] }[] {
  const rows = batches.map((batch) => ({
    batch,
    groups: groupViews(
      batch,
      readings.filter(({ clock }) => clock.batch === batch.id),
    ),
  }));
  return rows.sort((a, b) => compareAttention(needOf(a), needOf(b)) || a.batch.tag - b.batch.tag);
}

function needOf({ batch, groups }: { batch: Batch; groups: GroupView[] }): Attention {
  const none: Attention = { rank: 'nothing', leftMs: Infinity };
  if (batch.held) return groups.find(({ group }) => group.at === 'load')?.attention ?? none;
  // A batch whose connectors are all finished waits to be closed.
  return groups[0]?.attention ?? { rank: 'waits for hands', leftMs: 0 };
}
