import { foldBatch } from '../batch/fold.ts';
import type { Batch, Bench } from '../batch/types.ts';
import { idKey, standing, voidedIds } from '../batch/voids.ts';
import { benchWide, type Draft, type Entry, type EntryId } from '../event/entry.ts';
import { ok, type Result } from '../unit/result.ts';
import type { Command } from './commands.ts';
import { longestReason, refuse, requiredText, type Decision } from './context.ts';
import type { Refusal } from './refusal.ts';

type Of<Type extends Command['type']> = Extract<Command, { type: Type }>;

export const wrongTap = 'wrong tap';

/** Entries that an undo passes over: they say nothing about the work. */
const notWork: ReadonlySet<Entry['type']> = new Set(['clockSeen']);

/** What the next undo on a batch would take back: all entries of the latest command. */
export function undoable(batch: Batch): readonly EntryId[] {
  const last = batch.traces.findLast((trace) => !notWork.has(trace.type));
  if (!last) return [];
  return batch.traces
    .filter((trace) => trace.command === last.command && !notWork.has(trace.type))
    .map(({ entry }) => entry);
}

export function decideUndo(bench: Bench, command: Of<'undo'>): Decision {
  const batch = bench.batches[command.batch];
  if (!batch) return refuse({ code: 'batch unknown', batch: command.batch });
  const targets = undoable(batch);
  if (targets.length === 0) return refuse({ code: 'nothing to undo' });
  const voided = decideVoid(bench, { type: 'void', batch: batch.id, targets, reason: wrongTap, andWhatRests: false });
  if (!voided.ok) return voided;
  return ok([...voided.value, ...undoMix(bench, batch, targets)]);
}

/** A mix that was made by the same command, and that nothing else took, is taken back with it. */
function undoMix(bench: Bench, batch: Batch, targets: readonly EntryId[]): Draft[] {
  const taken = new Set(targets.map(idKey));
  const own = (bench.entries[batch.id] ?? []).filter((entry) => taken.has(idKey(entry)));
  const mixes = own.flatMap((entry) => ('mix' in entry.data && entry.data.mix !== undefined ? [entry.data.mix] : []));
  const commands = new Set(own.map((entry) => `${entry.page} ${entry.mono}`));
  const made = (bench.entries[benchWide] ?? []).filter(
    (entry) =>
      entry.type === 'adhesiveMixed' &&
      mixes.includes(entry.data.mix) &&
      commands.has(`${entry.page} ${entry.mono}`) &&
      batchesWith(bench, entry.data.mix).every((id) => id === batch.id),
  );
  if (made.length === 0) return [];
  const data = { targets: made.map(({ log, seq }) => ({ log, seq })), reason: wrongTap };
  return [{ batch: benchWide, type: 'voided', v: 1, data }];
}

function batchesWith(bench: Bench, mix: string): string[] {
  return Object.values(bench.batches)
    .filter((batch) => batch.connectors.some((one) => one.mix === mix || one.mixSeen === mix))
    .map((batch) => batch.id);
}

/** Takes entries back. Where later entries would no longer fit, names them, or takes them along if so asked. */
export function decideVoid(bench: Bench, command: Of<'void'>): Decision {
  const reason = requiredText(command.reason, 'reason', longestReason);
  if (!reason.ok) return reason;
  const entries = bench.entries[command.batch] ?? [];
  const named = checkTargets(entries, command.targets);
  if (named) return refuse(named);
  if (command.batch === benchWide) return decideVoidWide(bench, command, reason.value);
  const targets = withWhatRests(bench, entries, command);
  if (!targets.ok) return targets;
  return ok([{ batch: command.batch, type: 'voided', v: 1, data: { targets: targets.value, reason: reason.value } }]);
}

function checkTargets(entries: readonly Entry[], targets: readonly EntryId[]): Refusal | null {
  const gone = voidedIds(entries);
  if (targets.length === 0) return { code: 'entry unknown' };
  for (const target of targets) {
    const entry = entries.find((one) => one.log === target.log && one.seq === target.seq);
    if (!entry || gone.has(idKey(target))) return { code: 'entry unknown' };
    if (entry.type === 'voided') return { code: 'cannot take back a taking back' };
  }
  return null;
}

function withWhatRests(
  bench: Bench,
  entries: readonly Entry[],
  command: Of<'void'>,
): Result<{ log: string; seq: number }[], Refusal> {
  const alreadyMisfit = new Set(foldBatch(entries, bench.wide.recipes).misfits.map(({ entry }) => idKey(entry)));
  const chosen = new Map(command.targets.map((target) => [idKey(target), target]));
  for (;;) {
    const left = standing(entries).filter((entry) => !chosen.has(idKey(entry)));
    const resting = foldBatch(left, bench.wide.recipes)
      .misfits.map(({ entry }) => entry)
      .filter((entry) => !alreadyMisfit.has(idKey(entry)));
    if (resting.length === 0) return ok([...chosen.values()].map(({ log, seq }) => ({ log, seq })));
    if (!command.andWhatRests) return refuse({ code: 'others rest on it', resting });
    for (const entry of resting) chosen.set(idKey(entry), entry);
  }
}

/** A mix that connectors took, or a recipe that batches began with, is not taken back under them. */
function decideVoidWide(bench: Bench, command: Of<'void'>, reason: string): Decision {
  const entries = bench.entries[benchWide] ?? [];
  for (const target of command.targets) {
    const entry = entries.find((one) => one.log === target.log && one.seq === target.seq);
    if (entry?.type === 'adhesiveMixed') {
      const batches = batchesWith(bench, entry.data.mix);
      if (batches.length > 0) return refuse({ code: 'mix in use', batches });
    }
    if (entry?.type === 'recipeTaken') return refuse({ code: 'does not fit', why: 'recipe taken' });
  }
  const targets = command.targets.map(({ log, seq }) => ({ log, seq }));
  return ok([{ batch: benchWide, type: 'voided', v: 1, data: { targets, reason } }]);
}
