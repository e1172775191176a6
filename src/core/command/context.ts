import type { Batch, Bench } from '../batch/types.ts';
import { unfinished } from '../batch/connectors.ts';
import { stepIndexIn } from '../batch/open-batch.ts';
import type { Draft } from '../event/entry.ts';
import type { Step } from '../recipe/schema.ts';
import { elapsedMs, shifted, type Moment } from '../unit/moment.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import type { Late } from './commands.ts';
import type { Refusal } from './refusal.ts';

/** Who asks, and when, in bench and wall time of this tablet's log. */
export interface Context {
  readonly now: Moment;
  readonly by: string;
}

export type Decision = Result<readonly Draft[], Refusal>;

export const refuse = (refusal: Refusal) => failed(refusal);

/** The most that an entry may be late, in seconds: a shift. */
export const mostAgoS = 12 * 3600;
/** From here on a late entry says why, in seconds. */
export const agoNeedsReasonS = 120;
export const longestReason = 200;

/** An open batch that is not on hold, or why it takes nothing now. */
export function openFor(bench: Bench, id: string, heldToo = false): Result<Batch, Refusal> {
  const batch = bench.batches[id];
  if (!batch) return refuse({ code: 'batch unknown', batch: id });
  if (batch.closed) return refuse({ code: 'batch is closed' });
  if (batch.held && !heldToo) return refuse({ code: 'batch is held', reason: batch.held.reason });
  return ok(batch);
}

export function stepOf(batch: Batch, id: string): Result<{ step: Step; index: number }, Refusal> {
  const index = stepIndexIn(batch.recipe, id);
  const step = batch.recipe.steps[index];
  return step ? ok({ step, index }) : refuse({ code: 'no such step', step: id });
}

/** Refuses connectors that are not there, none at all, or ones that stand elsewhere than at the step. */
export function checkAtStep(batch: Batch, index: number, numbers: readonly number[]): Refusal | null {
  const unknown = checkKnown(batch, numbers);
  if (unknown) return unknown;
  const elsewhere = numbers.filter((number) => {
    const stands = batch.connectors[number - 1]?.stands;
    return stands?.at !== 'step' || stands.step !== index;
  });
  return elsewhere.length > 0 ? { code: 'not at this step', numbers: elsewhere } : null;
}

export function checkKnown(batch: Batch, numbers: readonly number[]): Refusal | null {
  if (numbers.length === 0) return { code: 'no connectors' };
  const unknown = numbers.find((number) => !batch.connectors[number - 1]);
  return unknown === undefined ? null : { code: 'no such connector', number: unknown };
}

export function checkUnfinished(batch: Batch, numbers: readonly number[]): Refusal | null {
  const finished = numbers.filter((number) => {
    const connector = batch.connectors[number - 1];
    return connector !== undefined && !unfinished(connector);
  });
  return finished.length > 0 ? { code: 'already finished', numbers: finished } : null;
}

/** How many connectors a step takes at once by its recipe. */
export function checkSize(step: Step, count: number): Refusal | null {
  if (step.goes === 'connector by connector' && count > 1) return { code: 'one at a time' };
  if (step.goes === 'load by load' && step.loadSize !== undefined && count > step.loadSize) {
    return { code: 'load too large', found: count, most: step.loadSize };
  }
  return null;
}

/** When it happened, and what the entry says of its lateness. */
export function whenHappened(
  now: Moment,
  late: Late | undefined,
): Result<{ at: Moment; data: { ago?: number; agoReason?: string } }, Refusal> {
  if (!late || late.agoS === 0) return ok({ at: now, data: {} });
  if (!(late.agoS > 0 && late.agoS <= mostAgoS)) return refuse({ code: 'ago out of range', mostS: mostAgoS });
  const reason = late.reason.trim();
  if (reason.length > longestReason) {
    return refuse({ code: 'text too long', field: 'reason', length: reason.length, most: longestReason });
  }
  if (late.agoS > agoNeedsReasonS && reason === '') return refuse({ code: 'ago needs a reason' });
  return ok({
    at: shifted(now, -late.agoS * 1000),
    data: { ago: late.agoS, ...(reason === '' ? {} : { agoReason: reason }) },
  });
}

/** Seconds since the same person's previous entry on this tablet, where there is one. */
export function gapOf(bench: Bench, context: Context): { gap?: number } {
  const before = bench.wide.lastEntryBy[`${context.now.log} ${context.by}`];
  if (!before || context.by === '') return {};
  return { gap: Math.max(0, Math.round(elapsedMs(before, context.now) / 100) / 10) };
}

/** A text that must be there and not too long, trimmed. */
export function requiredText(
  text: string,
  field: Extract<Refusal, { code: 'text missing' }>['field'],
  most: number,
): Result<string, Refusal> {
  const trimmed = text.trim();
  if (trimmed === '') return refuse({ code: 'text missing', field });
  if (trimmed.length > most) return refuse({ code: 'text too long', field, length: trimmed.length, most });
  return ok(trimmed);
}
