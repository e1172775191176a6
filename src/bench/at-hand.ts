import type { Bench } from '../core/batch/types.ts';
import type { Command } from '../core/command/commands.ts';
import { undoable } from '../core/command/decide-void.ts';
import { idKey } from '../core/batch/voids.ts';
import { benchWide, type Entry, type EntryId, type Head } from '../core/event/entry.ts';
import type { LogStore } from '../log/store.ts';

/*
 * A start reads open work alone. What else a command must see, so that it is decided as if all were at hand, is found
 * here.
 */

/** The batch that a command is about and that is not at hand. */
export function batchToFetch(bench: Bench, command: Command): string | null {
  if (!('batch' in command) || command.batch === benchWide || bench.batches[command.batch]) return null;
  return command.batch;
}

/** Whether a command rests on bench-wide entries older than the page. */
export function needsBenchWide(bench: Bench, command: Command): boolean {
  switch (command.type) {
    case 'void':
      return command.batch === benchWide;
    case 'use mix':
      return bench.wide.mixes[command.mix] === undefined;
    case 'undo':
      // The mix may go with the step that took it.
      return mixesTaken(bench, command.batch).length > 0;
    default:
      return false;
  }
}

/** Entries of mixes that a command might take back: not under a closed batch that took them. */
export function mixesInQuestion(bench: Bench, command: Command): readonly Entry[] {
  if (command.type === 'undo') return mixesTaken(bench, command.batch).flatMap((mix) => mixedIn(bench, mix) ?? []);
  if (command.type !== 'void' || command.batch !== benchWide) return [];
  const targets = new Set(command.targets.map(idKey));
  return (bench.entries[benchWide] ?? []).filter(
    (entry) => entry.type === 'adhesiveMixed' && targets.has(idKey(entry)),
  );
}

function mixesTaken(bench: Bench, batch: string): string[] {
  const known = bench.batches[batch];
  const targets = new Set((known ? undoable(known) : []).map(idKey));
  return (bench.entries[batch] ?? []).flatMap((entry) =>
    targets.has(idKey(entry)) && 'mix' in entry.data && entry.data.mix !== undefined ? [entry.data.mix] : [],
  );
}

function mixedIn(bench: Bench, mix: string): Entry | undefined {
  return bench.entries[benchWide]?.find((entry) => entry.type === 'adhesiveMixed' && entry.data.mix === mix);
}

const linesAtOnce = 1000;

/** Ids of the batches that name a mix in an entry made after it was mixed. */
export async function batchesWithMix(store: LogStore, heads: readonly Head[], mixed: Entry): Promise<string[]> {
  if (mixed.type !== 'adhesiveMixed') return [];
  const named = `"mix":${JSON.stringify(mixed.data.mix)}`;
  const batches = new Set<string>();
  for (const { log } of heads) {
    let after: EntryId = { log, seq: log === mixed.log ? mixed.seq : 0 };
    for (;;) {
      const lines = await store.lines(after, linesAtOnce);
      const own = lines.filter((line) => line.log === log);
      for (const { batch, text } of own) if (batch !== benchWide && text.includes(named)) batches.add(batch);
      const last = own.at(-1);
      if (!last || own.length < linesAtOnce) break;
      after = last;
    }
  }
  return [...batches];
}
