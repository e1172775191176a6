import type { Words } from '../words/index.ts';
import { timeOfDay } from '../words/format.ts';
import type { BenchState } from './bench-state.svelte.ts';
import type { Tablet } from './tablet.svelte.ts';

/** What stands at the right end of the top bar: whether entries are saved, the screen stays on, and sound can be heard. */
export function barFacts(bench: BenchState, tablet: Tablet, words: Words, offsetMinutes: number) {
  const say = words.common;
  const awake = tablet.awake === 'held';
  const sound = tablet.sound === 'ready' ? say.on : tablet.sound === 'absent' ? say.none : say.tapOnce;
  return [
    {
      name: say.saved,
      value: timeOfDay(bench.savedWallMs, offsetMinutes),
      wanting: bench.saving.state === 'not saved',
    },
    { name: say.awake, value: awake ? say.yes : say.no, wanting: !awake && bench.clocks.length > 0 },
    { name: say.sound, value: sound, wanting: tablet.sound !== 'ready' && bench.clocks.length > 0 },
  ];
}

/** Tablet, who and which shift. */
export function barContext(bench: BenchState, words: Words): string[] {
  const { tablet, onShift } = bench.bench.wide;
  const who = onShift
    ? [onShift.operator, onShift.shift].filter((part) => part !== '').join(', ')
    : words.common.nobody;
  return tablet === '' ? [who] : [tablet, who];
}
