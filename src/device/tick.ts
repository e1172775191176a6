import { observed, type Capability } from './capability.ts';

/** Ticks from the page itself are late while it is hidden. */
export type TickSource = 'worker' | 'page timer';

export interface Tick extends Capability<TickSource> {
  /** Called about every 250 ms. A tick says only "look at the clock", never how much time passed. */
  onTick(listener: () => void): () => void;
}

export interface TickWindow {
  setInterval(handler: () => void, ms: number): number;
  clearInterval(timer: number): void;
}

export interface TickWorker extends EventTarget {
  terminate(): void;
}

const startWorker = (): TickWorker => new Worker(new URL('./tick-worker.ts', import.meta.url), { type: 'module' });

/** The page ticks for itself until the worker's first tick arrives, and again from the moment the worker fails. */
export function startTick(window: TickWindow = globalThis.window, start: () => TickWorker = startWorker): Tick {
  const source = observed<TickSource>('page timer');
  const listeners = new Set<() => void>();
  const emit = () => {
    for (const listener of [...listeners]) listener();
  };

  let timer: number | null = window.setInterval(emit, 250);
  const stopTimer = () => {
    if (timer !== null) window.clearInterval(timer);
    timer = null;
  };

  let worker: TickWorker | null = null;
  try {
    worker = start();
    worker.addEventListener('message', () => {
      stopTimer();
      source.set('worker');
      emit();
    });
    worker.addEventListener('error', () => {
      timer ??= window.setInterval(emit, 250);
      source.set('page timer');
    });
  } catch {
    // Some policies refuse workers by throwing; the page timer is running already.
  }

  return {
    get current() {
      return source.current;
    },
    subscribe: source.subscribe,
    onTick(listener) {
      const own = () => listener();
      listeners.add(own);
      return () => void listeners.delete(own);
    },
    release() {
      stopTimer();
      worker?.terminate();
      listeners.clear();
    },
  };
}
