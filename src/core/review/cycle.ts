import { unfinished } from '../batch/connectors.ts';
import { unattended } from '../batch/step-kinds.ts';
import type { Batch, Connector } from '../batch/types.ts';
import { acrossClocks, elapsedMs, type Moment } from '../unit/moment.ts';
import { isFirstPass } from './first-pass.ts';

/** Cycle time in its parts, in whole ms: `handsOnMs + cureMs + waitingMs` is `totalMs`, always. */
export interface CycleParts {
  readonly totalMs: number;
  /** An estimate: see `handsOnShareMs`. */
  readonly handsOnMs: number;
  /** In an oven or cooling down, however it ended. */
  readonly cureMs: number;
  readonly waitingMs: number;
}

export interface Cycle extends CycleParts {
  readonly attempt: number;
  readonly firstPass: boolean;
  /** Null while it is in work; the times then reach to the last thing that happened to it. */
  readonly finishedAt: Moment | null;
  /** The total rests on two tablets' wall clocks. */
  readonly acrossClocks: boolean;
}

/**
 * Cycle time of one connector, all attempts together, from the opening of its batch to its end.
 *
 * Cure is measured and hands-on is estimated, so where both exceed the total, hands-on gives way. That happens
 * where a person's entry reaches back over a cure that another person tended, or where two tablets' clocks differ.
 */
export function cycleOf(batch: Batch, connector: Connector): Cycle {
  const totalMs = Math.max(0, Math.round(elapsedMs(batch.opened, connector.since)));
  const cureMs = Math.min(totalMs, Math.round(cureSpansMs(batch, connector)));
  const handsOnMs = Math.min(totalMs - cureMs, Math.round(handsOnSharesMs(connector)));
  return {
    totalMs,
    handsOnMs,
    cureMs,
    waitingMs: totalMs - cureMs - handsOnMs,
    attempt: connector.attempt,
    firstPass: isFirstPass(connector),
    finishedAt: unfinished(connector) ? null : connector.since,
    acrossClocks: acrossClocks(batch.opened, connector.since),
  };
}

function handsOnSharesMs(connector: Connector): number {
  let sumMs = 0;
  for (const happening of connector.history) if ('handsOnMs' in happening) sumMs += happening.handsOnMs;
  return sumMs;
}

/** A load is left by its end, but also by a connector sent back or scrapped out of it: that time was cure too. */
function cureSpansMs(batch: Batch, connector: Connector): number {
  let sumMs = 0;
  let loadedAt: Moment | null = null;
  for (const happening of connector.history) {
    if (loadedAt) sumMs += Math.max(0, elapsedMs(loadedAt, happening.at));
    const step = happening.kind === 'loaded' ? batch.recipe.steps[happening.step] : undefined;
    loadedAt = step && unattended(step) ? happening.at : null;
  }
  return sumMs;
}
