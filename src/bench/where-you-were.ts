import type { Batch, Trace } from '../core/batch/types.ts';
import { compareMoments } from '../core/unit/moment.ts';
import type { Words } from '../words/index.ts';
import { numberList } from '../words/format.ts';
import type { ShowTime } from './clock-words.ts';

export interface LastWork {
  readonly batch: Batch;
  readonly trace: Trace;
}

/** The latest work on each open batch, the latest first. */
export function lastWork(batches: readonly Batch[]): LastWork[] {
  return batches
    .flatMap((batch) => {
      const trace = batch.traces.findLast(({ type }) => type !== 'clockSeen');
      return trace ? [{ batch, trace }] : [];
    })
    .sort((a, b) => compareMoments(b.trace.entered, a.trace.entered));
}

/** "Film 3 µm, 1 to 12; last entry 10:22, MK". */
export function lastWorkWords({ batch, trace }: LastWork, words: Words, time: ShowTime): string {
  const step = trace.step === null ? null : batch.recipe.steps[trace.step]?.texts.en.title;
  const what = step ?? words.batch.traceLabel[trace.type] ?? trace.type;
  const numbers = trace.connectors.length === 0 ? '' : numberList(trace.connectors);
  return words.bench.away.line(numbers === '' ? what : `${what}, ${numbers}`, time(trace.entered), trace.by);
}
