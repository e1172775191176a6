import { wilsonInterval, type Interval } from './wilson.ts';

/** A share that never stands without its numbers and its 95 % Wilson interval. */
export interface Ratio extends Interval {
  readonly count: number;
  readonly of: number;
  /** From 0 to 1. */
  readonly share: number;
}

/** Null is a ratio of nothing: it is shown as "-", not as 0 %. */
export function ratioOf(count: number, of: number): Ratio | null {
  const interval = wilsonInterval(count, of);
  return interval && { count, of, share: count / of, ...interval };
}
