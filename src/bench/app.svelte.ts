import { getContext, setContext } from 'svelte';
import { readTakenRecipe } from '../core/recipe/parse.ts';
import type { Moment } from '../core/unit/moment.ts';
import { benchWide } from '../core/event/entry.ts';
import { createClock } from '../device/clock.ts';
import { watchClock } from '../device/clock-watch.ts';
import { randomId } from '../device/random-id.ts';
import { startTick } from '../device/tick.ts';
import { StoreError, type StoreFault } from '../log/errors.ts';
import { openIndexedDbStore } from '../log/indexed-db-store.ts';
import { steadyStore } from '../log/steady-store.ts';
import { languages, type Words } from '../words/index.ts';
import { BenchLog } from './bench-log.ts';
import { BenchState } from './bench-state.svelte.ts';
import { showTimeAt, type ShowTime } from './clock-words.ts';
import { readMode, writeMode, type Mode } from './mode.ts';
import { Tablet } from './tablet.svelte.ts';

export type Fault = StoreFault | { readonly kind: 'unknown'; readonly why: string };

/** How far the start has come. */
export type Phase =
  | { readonly at: 'starting' }
  | { readonly at: 'running'; readonly bench: BenchState }
  | { readonly at: 'not started'; readonly fault: Fault };

/** Everything that a page needs, made once a page life. */
export class App {
  readonly words: Words = languages.en;
  readonly tablet: Tablet;
  readonly mode: Mode = readMode(localStorage);
  readonly randomId = randomId;
  /** Minutes east of UTC, now; a zone change shows with the next second. */
  offsetMinutes = $state(0);
  phase = $state.raw<Phase>({ at: 'starting' });

  constructor(readonly version: string) {
    this.tablet = new Tablet(version);
  }

  async start(): Promise<void> {
    try {
      const clock = createClock();
      this.offsetMinutes = clock.stamp().offset;
      const store = await steadyStore((gone) => openIndexedDbStore(this.mode.database, gone));
      const log = await BenchLog.start({ store, clock, readRecipe: readTakenRecipe, randomId, app: this.version });
      const bench = new BenchState(log);
      const tick = startTick();
      watchClock({
        clock,
        tick,
        onJump: ({ kind }) => void bench.note([{ batch: benchWide, type: kind, v: 1, data: {} }]),
        onSecond: () => {
          this.offsetMinutes = clock.stamp().offset;
          this.#second(bench);
        },
      });
      this.phase = { at: 'running', bench };
    } catch (error) {
      const fault: Fault =
        error instanceof StoreError
          ? error.fault
          : { kind: 'unknown', why: error instanceof Error ? error.message : String(error) };
      this.phase = { at: 'not started', fault };
    }
  }

  /** Shows moments as times of day, reckoned from `now`. */
  showTime(now: Moment): ShowTime {
    return showTimeAt(now, this.offsetMinutes);
  }

  /** Loads the page again on the demo bench, which fills itself. */
  enterDemo(): void {
    writeMode(localStorage, 'demo');
    window.location.reload();
  }

  #second(bench: BenchState): void {
    const fresh = bench.tick();
    const [worst] = bench.calling;
    this.tablet.alarmSound.sound(worst ? { urgency: worst.urgency, heldForMs: worst.lateMs } : null);
    const [first] = fresh;
    if (first) this.tablet.vibration.vibrate(first.urgency);
    if (bench.clocks.length > 0) this.tablet.wakeLock.hold();
    else this.tablet.wakeLock.letGo();
  }
}

const key = Symbol('app');

export function provideApp(app: App): App {
  return setContext(key, app);
}

export function useApp(): App {
  return getContext<App>(key);
}

/** The bench of a page that is shown only once the start is over. */
export function useBench(): BenchState {
  const { phase } = useApp();
  if (phase.at !== 'running') throw new Error('the bench is not running');
  return phase.bench;
}
