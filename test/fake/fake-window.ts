/** Timers that run only when a test says how much time passed. */
export class CountedTime {
  wallMs = Date.UTC(2026, 4, 4, 8, 0, 0);
  monoMs = 0;
  #timers = new Map<number, { dueMs: number; everyMs: number | null; handler: () => void }>();
  #next = 1;

  setTimeout = (handler: () => void, ms: number): number => this.#add(handler, ms, null);
  setInterval = (handler: () => void, ms: number): number => this.#add(handler, ms, ms);
  clearTimeout = (timer: number): void => void this.#timers.delete(timer);
  clearInterval = this.clearTimeout;

  get timerCount(): number {
    return this.#timers.size;
  }

  /** Both clocks go on, and every timer fires in its order. */
  pass(ms: number): void {
    const endMs = this.monoMs + ms;
    for (;;) {
      const due = [...this.#timers].filter(([, t]) => t.dueMs <= endMs).sort((a, b) => a[1].dueMs - b[1].dueMs)[0];
      if (due === undefined) break;
      const [id, timer] = due;
      this.#set(Math.max(timer.dueMs, this.monoMs));
      if (timer.everyMs === null) this.#timers.delete(id);
      else timer.dueMs += timer.everyMs;
      timer.handler();
    }
    this.#set(endMs);
  }

  /** Time passes and nothing runs. */
  sleep(wallMs: number, monoMs: number): void {
    this.wallMs += wallMs;
    this.monoMs += monoMs;
    for (const timer of this.#timers.values()) timer.dueMs = Math.max(timer.dueMs, this.monoMs);
  }

  #set(monoMs: number): void {
    this.wallMs += monoMs - this.monoMs;
    this.monoMs = monoMs;
  }

  #add(handler: () => void, ms: number, everyMs: number | null): number {
    const id = this.#next;
    this.#next += 1;
    this.#timers.set(id, { dueMs: this.monoMs + ms, everyMs, handler });
    return id;
  }
}

export class FakeDocument extends EventTarget {
  visibilityState: DocumentVisibilityState = 'visible';
  baseURI = 'https://bench.test/lintfree/';
}

/** A bare EventTarget with the few things that every browser window has; a capability's own part is added by its test. */
export class FakeWindow extends EventTarget {
  readonly document = new FakeDocument();
  readonly time = new CountedTime();
  readonly setTimeout = this.time.setTimeout;
  readonly clearTimeout = this.time.clearTimeout;
  readonly setInterval = this.time.setInterval;
  readonly clearInterval = this.time.clearInterval;
  readonly performance = { now: () => this.time.monoMs };

  tap(): void {
    this.dispatchEvent(new Event('pointerup'));
  }

  show(state: DocumentVisibilityState): void {
    this.document.visibilityState = state;
    this.document.dispatchEvent(new Event('visibilitychange'));
  }
}

/** Lets promises that are settled already run their continuations. */
export async function settle(): Promise<void> {
  for (let turn = 0; turn < 20; turn += 1) await Promise.resolve();
}
