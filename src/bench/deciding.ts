/*
 * What a command needs and showing the bench does not: it is loaded once the bench stands, so that a tablet shows its
 * clocks sooner.
 */
export { decide } from '../core/command/decide.ts';
export { batchesWithMix, batchToFetch, mixesInQuestion, needsBenchWide } from './at-hand.ts';
export { derivedRows } from './derived-rows.ts';
export { readSummaryRows } from './summary-rows.ts';
