import { standardSecondsOf } from '../recipe/read.ts';
import type { Step } from '../recipe/schema.ts';

/** How many standard times an entry may claim at most; what is longer was something else. */
const mostStandards = 3;

/**
 * Estimated hands-on time of one connector in an entry, in ms: the time since the same person's previous entry on
 * this tablet, at most three times the step's standard time, shared by the connectors in the entry. Nothing where
 * no earlier entry is known. Since the gap is counted over all batches, one minute is never counted twice.
 */
export function handsOnShareMs(step: Step, connectors: number, gapS: number | undefined): number {
  if (gapS === undefined) return 0;
  return (Math.min(gapS, mostStandards * standardSecondsOf(step, connectors)) * 1000) / connectors;
}
