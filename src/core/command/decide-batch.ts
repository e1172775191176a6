import { unfinished } from '../batch/connectors.ts';
import type { Bench } from '../batch/types.ts';
import type { Draft } from '../event/entry.ts';
import { ok } from '../unit/result.ts';
import type { Command } from './commands.ts';
import { longestReason, openFor, refuse, requiredText, type Decision } from './context.ts';
import { firstFreeTag, tagsTaken } from './decide-open.ts';

type Of<Type extends Command['type']> = Extract<Command, { type: Type }>;

export function decideHold(bench: Bench, command: Of<'hold batch'>): Decision {
  const open = openFor(bench, command.batch);
  if (!open.ok) return open;
  const reason = requiredText(command.reason, 'reason', longestReason);
  if (!reason.ok) return reason;
  return ok([{ batch: command.batch, type: 'batchHeld', v: 1, data: { reason: reason.value } }]);
}

export function decideResume(bench: Bench, command: Of<'resume batch'>): Decision {
  const open = openFor(bench, command.batch, true);
  if (!open.ok) return open;
  if (!open.value.held) return refuse({ code: 'batch is not held' });
  return ok([{ batch: command.batch, type: 'batchResumed', v: 1, data: {} }]);
}

export function decideClose(bench: Bench, command: Of<'close batch'>): Decision {
  const open = openFor(bench, command.batch);
  if (!open.ok) return open;
  const count = open.value.connectors.filter(unfinished).length;
  if (count > 0) return refuse({ code: 'connectors unfinished', count });
  return ok([{ batch: command.batch, type: 'batchClosed', v: 1, data: { how: 'complete' } }]);
}

export function decideEndShort(bench: Bench, command: Of<'end batch short'>): Decision {
  const open = openFor(bench, command.batch, true);
  if (!open.ok) return open;
  const { defect } = command;
  if (!open.value.recipe.defects.some((one) => one.code === defect)) return refuse({ code: 'defect unknown', defect });
  return ok([{ batch: command.batch, type: 'batchClosed', v: 1, data: { how: 'short', defect } }]);
}

/** Takes the closing back; a tag that another batch wears by now is changed for a free one. */
export function decideReopen(bench: Bench, command: Of<'reopen batch'>): Decision {
  const batch = bench.batches[command.batch];
  if (!batch) return refuse({ code: 'batch unknown', batch: command.batch });
  if (!batch.closed) return refuse({ code: 'batch is open' });
  const closing = batch.traces.findLast((trace) => trace.type === 'batchClosed');
  if (!closing) return refuse({ code: 'entry unknown' });
  const data = { targets: [{ ...closing.entry }], reason: 'reopened' };
  const voided: Draft = { batch: batch.id, type: 'voided', v: 1, data };
  if (!tagsTaken(bench).has(batch.tag)) return ok([voided]);
  const tag = firstFreeTag(bench);
  if (tag === null) return refuse({ code: 'no tag free' });
  return ok([voided, { batch: batch.id, type: 'tagChanged', v: 1, data: { tag } }]);
}
