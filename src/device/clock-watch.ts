import type { Clock, ClockReading } from './clock.ts';
import { compareClocks, type ClockJump, type Rest } from './compare-clocks.ts';
import type { Tick } from './tick.ts';

export interface ClockWatch {
  /** Compares the clocks now; call it before an entry is written, so that a jump is on record first. */
  look(): ClockJump | null;
  release(): void;
}

export interface ClockWatchWindow extends EventTarget {
  readonly document: EventTarget & { readonly visibilityState: DocumentVisibilityState };
}

export interface ClockWatchOptions {
  readonly clock: Pick<Clock, 'read'>;
  readonly tick: Pick<Tick, 'onTick'>;
  /** A sleep or a clock set, told before `onSecond` of the same look. */
  readonly onJump: (jump: ClockJump) => void;
  /** About once a second, and at once when the page comes back: time to work out every clock again. */
  readonly onSecond: (reading: ClockReading) => void;
}

/** Ticks are never exactly a second apart; 50 ms early is on time. */
const secondMs = 950;

/** Compares wall and monotonic clock at every tick and whenever the page comes back from anywhere. */
export function watchClock(options: ClockWatchOptions, window: ClockWatchWindow = globalThis.window): ClockWatch {
  const { clock, tick, onJump, onSecond } = options;
  const { document } = window;
  const restNow = (): Rest => (document.visibilityState === 'hidden' ? 'hidden' : 'awake');

  let previous = clock.read();
  let told = previous;
  let rest = restNow();

  const look = () => {
    const reading = clock.read();
    const restSince = rest === 'awake' ? restNow() : rest;
    const jump = compareClocks(previous, reading, restSince);
    previous = reading;
    rest = restNow();
    if (jump !== null) onJump(jump);
    return jump;
  };
  const tell = () => {
    told = previous;
    onSecond(previous);
  };

  const stop = new AbortController();
  const { signal } = stop;
  const onReturn = () => {
    look();
    tell();
  };
  const stopTick = tick.onTick(() => {
    if (look() !== null || previous.mono - told.mono >= secondMs) tell();
  });
  document.addEventListener('visibilitychange', onReturn, { signal });
  document.addEventListener('freeze', () => void (rest = 'frozen'), { signal });
  document.addEventListener('resume', onReturn, { signal });
  window.addEventListener('focus', onReturn, { signal });
  window.addEventListener(
    'pageshow',
    (event) => {
      // A page taken out of the back-forward cache stood still, and not every browser says `freeze`.
      if ('persisted' in event && event.persisted === true) rest = 'frozen';
      onReturn();
    },
    { signal },
  );

  return {
    look,
    release() {
      stop.abort();
      stopTick();
    },
  };
}
