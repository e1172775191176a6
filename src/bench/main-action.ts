import type { Batch } from '../core/batch/types.ts';
import type { Command } from '../core/command/commands.ts';
import { isTimed } from '../core/recipe/read.ts';
import { numberList } from '../words/format.ts';
import type { Words } from '../words/index.ts';
import type { GroupView } from './batch-view.ts';

/** What the thumb's button does: a command at once, or a sheet that asks what the command still needs. */
export type MainAction =
  | { readonly does: 'command'; readonly label: string; readonly command: Command }
  | { readonly does: 'sheet'; readonly label: string; readonly sheet: 'mix' | 'oven' }
  | { readonly does: 'nothing'; readonly label: string };

export function mainAction(
  batch: Batch,
  view: GroupView | undefined,
  chosen: readonly number[],
  words: Words,
  newId: () => string,
): MainAction {
  const say = words.batch.main;
  const on = { batch: batch.id };
  if (!view) return { does: 'command', label: say.close, command: { type: 'close batch', ...on } };
  const { step, group } = view;
  if (group.at === 'load') {
    const command: Command = { type: 'end load', ...on, load: group.load.id, nextLoad: newId() };
    return { does: 'command', label: endLabel(view, words), command };
  }
  if (chosen.length === 0) return { does: 'nothing', label: say.noneChosen };
  const all = chosen.length === group.connectors.length;
  const numbers = numberList(chosen);
  const taken = { ...on, step: step.id, connectors: chosen };
  if (step.kind === 'mix') return { does: 'sheet', label: say.mix, sheet: 'mix' };
  if (step.kind === 'cure') return { does: 'sheet', label: say.trayIn(chosen.length), sheet: 'oven' };
  if (isTimed(step)) {
    const label = step.kind === 'polish' ? say.filmOn(chosen.length) : say.startWait;
    return { does: 'command', label, command: { type: 'start load', ...taken, load: newId(), station: '' } };
  }
  if (step.kind === 'inspect' || step.kind === 'measure') {
    const label = all && chosen.length > 1 ? say.passAll(chosen.length) : say.pass(numbers);
    return { does: 'command', label, command: { type: 'pass', ...taken } };
  }
  const { done } = step.texts.en;
  const label = all && chosen.length > 1 ? say.all(chosen.length, done) : say.some(numbers, done);
  return { does: 'command', label, command: { type: 'finish step', ...taken } };
}

function endLabel({ step, reading }: GroupView, words: Words): string {
  const say = words.batch.main;
  const ready = reading?.state === 'done' || reading?.state === 'over';
  if (step.kind === 'cure') return ready ? say.trayOut : say.trayOutEarly;
  if (step.kind === 'polish') return ready ? say.filmOff : say.filmOffEarly;
  return ready ? say.endWait : say.endEarly;
}

/** What the next undo takes back, named as the button names it. */
export function undoLabel(batch: Batch, words: Words): string | null {
  const last = batch.traces.findLast(({ type }) => type !== 'clockSeen');
  if (!last) return null;
  const first = batch.traces.find(({ command, type }) => command === last.command && type !== 'clockSeen') ?? last;
  const step = first.step === null ? null : (batch.recipe.steps[first.step]?.texts.en.label ?? null);
  const label = step ?? words.batch.traceLabel[first.type] ?? first.type;
  const numbers = first.connectors.length > 6 ? '' : numberList(first.connectors);
  return words.batch.undo(words.batch.undoWhat(label, numbers));
}
