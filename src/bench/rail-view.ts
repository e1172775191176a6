import { doseNow } from '../core/timer/cure-clock.ts';
import type { Reading } from '../core/timer/reading.ts';
import { shifted } from '../core/unit/moment.ts';
import type { RailClock } from '../ui/clock-rail-fold.ts';
import { countState, railWords } from './clock-words.ts';
import { tagLookOf, type ViewContext } from './row-view.ts';

/** "+7 more, next 14:02": of the clocks that are folded away, when the next one is due. */
export function railMore(folded: readonly RailClock[], { now, words, time }: ViewContext): string {
  const next = folded.find(({ remainingMs }) => remainingMs > 0 && remainingMs < Infinity);
  return words.bench.more(folded.length, next ? time(shifted(now, next.remainingMs)) : '');
}

/** All running clocks for the rail, the most urgent first, as the readings come. */
export function railClocks(readings: readonly Reading[], context: ViewContext): RailClock[] {
  return readings.map((reading): RailClock => {
    const { clock } = reading;
    const step = context.bench.batches[clock.batch]?.recipe.steps[clock.step];
    const dose = doseNow(context.bench, clock, context.now)?.dose ?? null;
    return {
      id: clock.id,
      tag: tagLookOf(clock.tag),
      remainingMs: reading.leftMs,
      state: countState(reading),
      text: railWords(clock, step?.texts.en.label ?? '', dose, context.words),
      href: `#/batch/${clock.batch}`,
    };
  });
}
