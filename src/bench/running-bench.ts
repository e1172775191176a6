import { benchWide } from '../core/event/entry.ts';
import { readTakenRecipe } from '../core/recipe/taken.ts';
import { createClock } from '../device/clock.ts';
import { watchClock } from '../device/clock-watch.ts';
import { randomId } from '../device/random-id.ts';
import { startTick } from '../device/tick.ts';
import { openIndexedDbStore } from '../log/indexed-db-store.ts';
import { steadyStore } from '../log/steady-store.ts';
import type { Gone } from '../log/store.ts';
import { BenchLog } from './bench-log.ts';
import { BenchState } from './bench-state.svelte.ts';
import type { Mode } from './mode.ts';

export interface RunningBench {
  readonly bench: BenchState;
  /** The demo shift was filled in just now: nobody comes back to it. */
  readonly isNew: boolean;
  /** Finishes what is being written and lets go of the log. */
  stop(): Promise<void>;
}

export interface RunOptions {
  readonly mode: Mode;
  /** Name and version of the program, for the first entry of the page. */
  readonly version: string;
  /** Called about once a second, with minutes east of UTC. */
  readonly onSecond: (bench: BenchState, offsetMinutes: number) => void;
  /** The log was closed from outside and cannot be opened again by itself. */
  readonly onGone: (why: Exclude<Gone, 'terminated'>) => void;
}

/** Opens the log, reads what is open, and keeps the time: everything that runs while this window has the bench. */
export async function runBench({ mode, version, onSecond, onGone }: RunOptions): Promise<RunningBench> {
  const clock = createClock();
  // A connection that the browser merely lost is opened anew at its next use.
  const gone = (why: Gone) => why !== 'terminated' && onGone(why);
  const store = steadyStore((closed) => openIndexedDbStore(mode.database, closed), { gone });
  const options = { store, clock, readRecipe: readTakenRecipe, randomId, app: version };
  const isNew = mode.kind === 'demo' && (await store.heads()).length === 0;
  if (isNew) {
    const { fillDemo } = await import('./demo/fill-demo.ts');
    await fillDemo(options);
  }
  const log = await BenchLog.start(options);
  // A jump of the clocks is on record before the entry that was about to be made.
  const bench = new BenchState(log, () => void watch.look());
  const tick = startTick();
  const watch = watchClock({
    clock,
    tick,
    onJump: ({ kind }) => void bench.note([{ batch: benchWide, type: kind, v: 1, data: {} }]),
    onSecond: () => onSecond(bench, clock.stamp().offset),
  });
  onSecond(bench, clock.stamp().offset);
  // Says at once where the first entry of the page could not be saved.
  void bench.note([]);
  return {
    bench,
    isNew,
    async stop() {
      watch.release();
      tick.release();
      await log.idle();
      log.close();
    },
  };
}
