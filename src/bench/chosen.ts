import type { Batch, Connector } from '../core/batch/types.ts';
import type { ConnectorMark, ConnectorState } from '../ui/connector-state.ts';
import type { Words } from '../words/index.ts';
import type { GroupView } from './batch-view.ts';

/**
 * Which connectors of the shown group an action takes: what the recipe takes at once, changed by taps. One by one, a
 * tap chooses another; in a load, a tap picks the ones that have trouble.
 */
export function chosenOf(view: GroupView, tapped: ReadonlySet<number>): readonly number[] {
  const numbers = view.group.connectors.map(({ number }) => number);
  const inGroup = numbers.filter((number) => tapped.has(number));
  if (view.group.at === 'load') return inGroup;
  if (view.step.goes === 'connector by connector') return inGroup.length > 0 ? inGroup.slice(-1) : view.take;
  const taken = new Set(view.take);
  return numbers.filter((number) => taken.has(number) !== tapped.has(number));
}

/** Taps as they add up: one by one the last tap counts alone. */
export function tap(view: GroupView, tapped: ReadonlySet<number>, number: number): ReadonlySet<number> {
  if (view.group.at === 'step' && view.step.goes === 'connector by connector') return new Set([number]);
  const next = new Set(tapped);
  if (!next.delete(number)) next.add(number);
  return next;
}

export function marksOf(
  batch: Batch,
  view: GroupView | undefined,
  chosen: readonly number[],
  words: Words,
): ConnectorMark[] {
  const picked = new Set(chosen);
  return batch.connectors.map((connector) => {
    const state = stateOf(connector, view, picked);
    return { number: connector.number, state, word: words.batch.stateWord[state] };
  });
}

function stateOf(connector: Connector, view: GroupView | undefined, picked: ReadonlySet<number>): ConnectorState {
  const { stands } = connector;
  if (stands.at === 'passed') return 'passed';
  if (stands.at === 'scrapped') return 'scrapped';
  if (!view) return 'done';
  const inGroup = view.group.connectors.some(({ number }) => number === connector.number);
  if (inGroup && view.group.at === 'load') return picked.has(connector.number) ? 'current' : 'in load';
  if (inGroup) {
    if (picked.has(connector.number))
      return picked.size === view.group.connectors.length && picked.size > 1 ? 'to do' : 'current';
    return view.step.goes === 'connector by connector' || !view.take.includes(connector.number) ? 'to do' : 'left out';
  }
  if (stands.at === 'load') return 'in load';
  if (stands.step > view.group.step) return 'done';
  return connector.reworks > 0 || connector.attempt > 1 ? 'sent back' : 'elsewhere';
}
