import type { Head } from './entry.ts';
import type { Fact } from './facts.ts';

/** Both clocks of a page at one instant, in ms: since 1970, and since the page began. */
export interface ClockReading {
  readonly wall: number;
  readonly mono: number;
  readonly page: string;
}

/** What bench time is reckoned on from: a log's last line. */
export type BenchPoint = ClockReading & Pick<Head, 'bench'>;

const between = (fromMs: number, toMs: number): number => Math.max(0, toMs - fromMs);

/** Monotonic clocks of two pages share no zero, so across pages only the wall clock is left. */
const sinceMs = (point: BenchPoint, reading: ClockReading): number =>
  point.page === reading.page ? between(point.mono, reading.mono) : between(point.wall, reading.wall);

/**
 * Milliseconds that count as passed between a log's last line and its next. Never negative.
 * A start of the page knows the wall clock alone; a sleep may have stopped the monotonic clock, so the larger
 * difference counts; a stated time is what the page itself measured and what the person added.
 */
export function elapsedMs(point: BenchPoint, next: Fact, reading: ClockReading): number {
  switch (next.type) {
    case 'tabletStarted':
      return between(point.wall, reading.wall);
    case 'tabletWoke':
      return Math.max(sinceMs(point, reading), between(point.wall, reading.wall));
    case 'timeStated':
      return sinceMs(point, reading) + Math.round(next.data.addedS * 1000);
    default:
      return sinceMs(point, reading);
  }
}

/** Bench time of a log's next line, in ms. A log's first line begins at what the wall clock shows. */
export function benchOf(point: BenchPoint | null, next: Fact, reading: ClockReading): number {
  return point === null ? reading.wall : point.bench + elapsedMs(point, next, reading);
}

/** Bench time now, in ms: that of the log's last line and what passed since. */
export function benchNow(head: BenchPoint, reading: ClockReading): number {
  return head.bench + sinceMs(head, reading);
}
