/*
 * What showing the bench does not need. It is loaded once the bench stands, so that a tablet shows its clocks sooner.
 */
export { decide } from '../core/command/decide.ts';
export { shiftOf } from '../core/review/shift.ts';
export { shiftWindow } from '../core/review/shift-window.ts';
export { batchesWithMix, batchToFetch, mixesInQuestion, needsBenchWide } from './at-hand.ts';
export { derivedRows } from './derived-rows.ts';
export { readSummaryRows } from './summary-rows.ts';
