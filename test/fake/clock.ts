import type { ClockReading } from '../../src/core/event/bench-time.ts';
import type { After } from '../../src/log/watchdog.ts';

/** A clock that only moves when a test moves it, with timers that fire on the way. */
export interface FakeClock {
  reading(): ClockReading;
  readonly after: After;
  /** Time passes on both clocks; what falls due runs, and what waits for it. */
  pass(ms: number): Promise<void>;
  /** The tablet sleeps: only the wall clock goes on, and no timer fires. */
  sleep(ms: number): void;
  /** Somebody sets the wall clock. */
  setWall(wallMs: number): void;
  /** The page is loaded anew: the monotonic clock begins again, and no timer survives. */
  reload(): void;
  /** How many timers wait. */
  waiting(): number;
}

/** Lets every promise that can settle do so. */
export async function settled(): Promise<void> {
  for (let turn = 0; turn < 50; turn += 1) await Promise.resolve();
}

export function fakeClock(wallMs = 1_764_676_800_000): FakeClock {
  let wall = wallMs;
  let mono = 0;
  let page = 1;
  let timers: { readonly dueMs: number; readonly run: () => void }[] = [];
  return {
    reading: () => ({ wall, mono, page: `page-${page}` }),
    after: (ms, run) => {
      const timer = { dueMs: mono + ms, run };
      timers.push(timer);
      return () => {
        timers = timers.filter((other) => other !== timer);
      };
    },
    pass: async (ms) => {
      const endMs = mono + ms;
      await settled();
      for (;;) {
        const next = timers.filter(({ dueMs }) => dueMs <= endMs).sort((a, b) => a.dueMs - b.dueMs)[0];
        const untilMs = next?.dueMs ?? endMs;
        wall += untilMs - mono;
        mono = untilMs;
        if (next === undefined) return;
        timers = timers.filter((timer) => timer !== next);
        next.run();
        await settled();
      }
    },
    sleep: (ms) => {
      wall += ms;
    },
    setWall: (to) => {
      wall = to;
    },
    reload: () => {
      mono = 0;
      page += 1;
      timers = [];
    },
    waiting: () => timers.length,
  };
}
