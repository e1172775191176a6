import { getContext, setContext } from 'svelte';
import type { Moment } from '../core/unit/moment.ts';
import { randomId } from '../device/random-id.ts';
import { StoreError, type StoreFault } from '../log/errors.ts';
import { takeWriter, type Writer, type WriterState } from '../log/writer.ts';
import { languages, type Words } from '../words/index.ts';
import { AwayNotice } from './away-notice.svelte.ts';
import type { BenchState } from './bench-state.svelte.ts';
import { showTimeAt, type ShowTime } from './clock-words.ts';
import { readMode, writeMode, type Mode } from './mode.ts';
import { runBench, type RunningBench } from './running-bench.ts';
import { Tablet } from './tablet.svelte.ts';

export type Fault = StoreFault | { readonly kind: 'removed' } | { readonly kind: 'unknown'; readonly why: string };

/** How far the start has come. One window has the bench at a time. */
export type Phase =
  | { readonly at: 'starting' }
  | { readonly at: 'running'; readonly bench: BenchState }
  | { readonly at: 'other window' }
  | { readonly at: 'not started'; readonly fault: Fault };

/** Everything that a page needs, made once a page life. */
export class App {
  readonly words: Words = languages.en;
  readonly tablet: Tablet;
  readonly mode: Mode = readMode(localStorage);
  readonly randomId = randomId;
  readonly away = new AwayNotice();
  /** Minutes east of UTC, now; a zone change shows with the next second. */
  offsetMinutes = $state(0);
  phase = $state.raw<Phase>({ at: 'starting' });
  #writer: Writer | null = null;
  #running: RunningBench | null = null;

  constructor(readonly version: string) {
    this.tablet = new Tablet(version);
  }

  async start(): Promise<void> {
    const { database } = this.mode;
    this.#writer = await takeWriter(database, {
      locks: navigator.locks,
      channel: new BroadcastChannel(`${database} windows`),
      changed: (state) => void this.#writerChanged(state),
      letGo: () => this.#running?.stop(),
    });
  }

  /** Takes the bench over from the other window. */
  useHere(): void {
    this.#writer?.useHere();
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

  async #writerChanged(state: WriterState): Promise<void> {
    if (state !== 'writing') {
      this.#running = null;
      this.phase = { at: 'other window' };
      return;
    }
    try {
      const { mode, version } = this;
      this.#running = await runBench({
        mode,
        version,
        onSecond: (bench, offset) => this.#second(bench, offset),
        onGone: (why) => {
          this.phase = { at: 'not started', fault: { kind: why === 'removed' ? 'removed' : 'newer' } };
        },
      });
      this.phase = { at: 'running', bench: this.#running.bench };
      this.away.started(this.#running.bench.openBatches.length > 0 && !this.#running.isNew);
    } catch (error) {
      this.phase = { at: 'not started', fault: faultOf(error) };
    }
  }

  #second(bench: BenchState, offsetMinutes: number): void {
    this.offsetMinutes = offsetMinutes;
    const fresh = bench.tick();
    const [worst] = bench.calling;
    this.tablet.alarmSound.sound(worst ? { urgency: worst.urgency, heldForMs: worst.lateMs } : null);
    const [first] = fresh;
    if (first) this.tablet.vibration.vibrate(first.urgency);
    if (bench.clocks.length > 0) this.tablet.wakeLock.hold();
    else this.tablet.wakeLock.letGo();
    if (bench.wrote) void this.tablet.protectOnce();
  }
}

function faultOf(error: unknown): Fault {
  if (error instanceof StoreError) return error.fault;
  return { kind: 'unknown', why: error instanceof Error ? error.message : String(error) };
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
