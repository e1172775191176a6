import { foldBatch } from '../batch/fold.ts';
import type { Bench } from '../batch/types.ts';
import { benchWide, type Draft, type Entry } from '../event/entry.ts';
import type { Command } from './commands.ts';
import { refuse, type Context, type Decision } from './context.ts';
import { decideClose, decideEndShort, decideHold, decideReopen, decideResume } from './decide-batch.ts';
import {
  decideDisturbOven,
  decideReadOven,
  decideSeeClock,
  decideSetBench,
  decideSetOven,
  decideSignOn,
  decideStateTime,
} from './decide-bench.ts';
import { decideEndLoad, decideStartLoad } from './decide-load.ts';
import { decideOpenBatch, decideTakeRecipe, tagsTaken } from './decide-open.ts';
import { decideFinishStep, decideMixAdhesive, decideUseMix } from './decide-step.ts';
import { decidePass, decideScrap, decideSendBack } from './decide-trouble.ts';
import { decideUndo, decideVoid } from './decide-void.ts';
import type { Refusal } from './refusal.ts';

/**
 * The one place where a wish becomes entries or a refusal. What is decided is tried on the batch before it is handed
 * out, so an accepted command never leaves an entry that does not fit, and a refused one leaves none.
 */
export function decide(bench: Bench, command: Command, context: Context): Decision {
  const decision = choose(bench, command, context);
  if (!decision.ok) return decision;
  const unfit = tryOut(bench, decision.value, context);
  return unfit ? refuse(unfit) : decision;
}

const earlier = 'earlier than what it follows';

function choose(bench: Bench, command: Command, context: Context): Decision {
  switch (command.type) {
    case 'open batch':
      return decideOpenBatch(bench, command);
    case 'finish step':
      return decideFinishStep(bench, command, context);
    case 'mix adhesive':
      return decideMixAdhesive(bench, command, context);
    case 'use mix':
      return decideUseMix(bench, command, context);
    case 'start load':
      return decideStartLoad(bench, command, context);
    case 'end load':
      return decideEndLoad(bench, command, context);
    case 'pass':
      return decidePass(bench, command, context);
    case 'send back':
      return decideSendBack(bench, command, context);
    case 'scrap':
      return decideScrap(bench, command, context);
    case 'hold batch':
      return decideHold(bench, command);
    case 'resume batch':
      return decideResume(bench, command);
    case 'close batch':
      return decideClose(bench, command);
    case 'end batch short':
      return decideEndShort(bench, command);
    case 'reopen batch':
      return decideReopen(bench, command);
    case 'undo':
      return decideUndo(bench, command);
    case 'void':
      return decideVoid(bench, command);
    case 'see clock':
      return decideSeeClock(bench, command);
    case 'set bench':
      return decideSetBench(command);
    case 'sign on':
      return decideSignOn(bench, command);
    case 'take recipe':
      return decideTakeRecipe(bench, command);
    case 'set oven':
      return decideSetOven(command, context);
    case 'read oven':
      return decideReadOven(bench, command, context);
    case 'disturb oven':
      return decideDisturbOven(bench, command, context);
    case 'state time':
      return decideStateTime(command);
  }
}

/**
 * Why decided entries cannot stand, found by folding their batch with them: one would be a misfit, or a batch that they
 * open again would wear the tag of another.
 */
function tryOut(bench: Bench, drafts: readonly Draft[], context: Context): Refusal | null {
  const touched = new Set(drafts.map((draft) => draft.batch).filter((batch) => batch !== benchWide));
  for (const id of touched) {
    const before = bench.entries[id] ?? [];
    if (before.length === 0) continue;
    const added = drafts.filter((draft) => draft.batch === id).map((draft, index) => pretend(draft, index, context));
    const known = new Set(bench.batches[id]?.misfits.map(({ entry }) => `${entry.log} ${entry.seq}`));
    const { batch, misfits } = foldBatch([...before, ...added], bench.wide.recipes);
    const misfit = misfits.find(({ entry }) => !known.has(`${entry.log} ${entry.seq}`));
    if (misfit) return misfit.why === earlier ? { code: earlier } : { code: 'does not fit', why: misfit.why };
    if (batch && !batch.closed && tagsTaken(bench, id).has(batch.tag)) return { code: 'tag taken', tag: batch.tag };
  }
  return null;
}

/** A decided entry as it would stand in the log, for trying only; its number is one that no log reaches. */
function pretend(draft: Draft, index: number, { now, by }: Context): Entry {
  return {
    log: now.log,
    seq: Number.MAX_SAFE_INTEGER - 1000 + index,
    time: '',
    bench: now.bench,
    wall: now.wall,
    mono: -1,
    page: '',
    offset: 0,
    zone: '',
    by,
    prev: '',
    ...draft,
  };
}
