import type { Batch } from '../core/batch/types.ts';
import type { Command } from '../core/command/commands.ts';
import { isTimed } from '../core/recipe/read.ts';
import type { Words } from '../words/index.ts';
import type { GroupView } from './batch-view.ts';

/** What one tap does: a command that needs nothing more, or the batch page, where something must be asked or judged. */
export type RowAction =
  | { readonly does: 'command'; readonly label: string; readonly command: Command }
  | { readonly does: 'open'; readonly label: string };

/** The one action of a row. It commands only what cannot be a mistake of more than one undo. */
export function rowAction(batch: Batch, view: GroupView | undefined, words: Words, newId: () => string): RowAction {
  const say = words.bench.action;
  if (batch.held) return { does: 'open', label: words.bench.open };
  if (!view) return { does: 'command', label: say.closeBatch, command: { type: 'close batch', batch: batch.id } };
  const { step, group, reading } = view;
  if (group.at === 'load') {
    const ready = reading?.state === 'done' || (step.kind === 'polish' && reading?.state === 'over');
    const label = step.kind === 'cure' ? say.trayOut : step.kind === 'polish' ? say.endFilm : say.goOn;
    if (!ready) {
      const reads = step.kind === 'cure' && group.load.station !== '' && reading?.state !== 'over';
      return { does: 'open', label: reads ? say.enterReading : words.bench.open };
    }
    const command: Command = { type: 'end load', batch: batch.id, load: group.load.id, nextLoad: newId() };
    return { does: 'command', label, command };
  }
  if (isTimed(step) && step.kind !== 'cure') {
    const label = step.kind === 'polish' ? say.startFilm : say.startWait;
    const on = { batch: batch.id, step: step.id, connectors: view.take };
    return { does: 'command', label, command: { type: 'start load', ...on, load: newId(), station: '' } };
  }
  return { does: 'open', label: step.kind === 'cure' ? say.trayIn : step.texts.en.label };
}
