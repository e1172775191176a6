import type { Workbox } from 'workbox-window';
import { observed, type Capability } from './capability.ts';
import {
  askForStock,
  serviceWorkerUrl,
  type MessageTaker,
  type Stock,
  type StockTimer,
} from './service-worker-message.ts';

/**
 * `ready offline` is said only when every file was counted in the cache. `update waiting` also when another window has
 * already let the new version in, so that only this page is still the old one.
 */
export type AppUpdateState = 'unsupported' | 'installing' | 'ready offline' | 'update waiting' | 'updating' | 'failed';

export interface AppUpdate extends Capability<AppUpdateState> {
  /**
   * Lets the waiting version take over and reloads once. Only a person's consent may call it, when nothing is due and
   * everything is written: nothing else reloads the page.
   */
  accept(): void;
  checkNow(): Promise<'found' | 'none' | 'unreachable'>;
}

export interface AppUpdateWindow extends EventTarget, StockTimer {
  readonly document: EventTarget & { readonly baseURI: string; readonly visibilityState: DocumentVisibilityState };
  readonly location: { reload(): void };
  readonly navigator: {
    readonly serviceWorker?: EventTarget & { readonly controller: unknown };
  };
  readonly performance: { now(): number };
  setInterval(handler: () => void, ms: number): number;
  clearInterval(timer: number): void;
}

export type WorkerLike = EventTarget & MessageTaker & { readonly state: string };

export type RegistrationLike = EventTarget & {
  readonly installing: WorkerLike | null;
  readonly waiting: WorkerLike | null;
  readonly active: WorkerLike | null;
};

export interface Registrar {
  register(options: { immediate: true }): Promise<RegistrationLike | undefined>;
  update(): Promise<void>;
  messageSkipWaiting(): void;
}

export interface AppUpdateOptions {
  /** The version that this page was built as; the worker clears away older files only for a page of its own version. */
  readonly appVersion: string;
  readonly window?: AppUpdateWindow;
  readonly connect?: (scriptUrl: string) => Promise<Registrar>;
}

/** Loaded apart, because a page has work to do before it registers anything. */
const connectWorkbox = async (scriptUrl: string): Promise<Workbox> => {
  const workbox = await import('workbox-window');
  return new workbox.Workbox(scriptUrl, { updateViaCache: 'none' });
};

/** How long a waiting worker may take to get into control before it is offered again. */
const takeOverPatienceMs = 10_000;
const checkEveryMs = 3_600_000;

export function createAppUpdate(options: AppUpdateOptions): AppUpdate {
  const { appVersion, window = globalThis.window, connect = connectWorkbox } = options;
  const container = window.navigator.serviceWorker;
  const state = observed<AppUpdateState>(container === undefined ? 'unsupported' : 'installing');
  const stop = new AbortController();
  const { signal } = stop;

  let registrar: Registrar | null = null;
  let registration: RegistrationLike | null = null;
  let controller = container?.controller ?? null;
  /** This page is of an older version than the worker that serves it. */
  let overtaken = false;
  let accepted = false;
  let patience: number | null = null;
  let counting: Promise<Stock | null> | null = null;
  let checkedMs = window.performance.now();

  const waits = () => overtaken || (registration?.waiting != null && registration.active !== null);

  const look = async (): Promise<void> => {
    if (registration === null || accepted || signal.aborted) return;
    const { active, installing, waiting } = registration;
    if (waits()) state.set('update waiting');
    else if (active?.state === 'activated') {
      if (state.current === 'ready offline') return;
      counting ??= askForStock(active, appVersion, window).finally(() => (counting = null));
      const stock = await counting;
      // While the worker counted, an update may have come or gone.
      if (accepted || signal.aborted) return;
      if (waits()) state.set('update waiting');
      else state.set(stock?.missing === 0 ? 'ready offline' : 'failed');
    } else if (active === null) state.set(installing === null && waiting === null ? 'failed' : 'installing');
  };

  const follow = (worker: WorkerLike | null) => {
    worker?.addEventListener('statechange', () => void look(), { signal });
  };

  const register = async (): Promise<void> => {
    try {
      registrar ??= await connect(serviceWorkerUrl(window.document.baseURI));
      const found = await registrar.register({ immediate: true });
      if (found === undefined || signal.aborted) return;
      if (found !== registration) {
        registration = found;
        // Workbox stops watching after one update that came late; a tablet runs for weeks without a reload.
        found.addEventListener('updatefound', () => follow(found.installing), { signal });
        for (const worker of [found.installing, found.waiting, found.active]) follow(worker);
      }
      await look();
    } catch {
      state.set('failed');
    }
  };

  const checkNow = async (): Promise<'found' | 'none' | 'unreachable'> => {
    checkedMs = window.performance.now();
    if (container === undefined) return 'unreachable';
    if (registrar === null || registration === null || registration.active === null) {
      // A first install that failed leaves no registration to update.
      registration = null;
      registrar = null;
      await register();
    } else {
      try {
        await registrar.update();
      } catch {
        return 'unreachable';
      }
      await look();
    }
    if (state.current === 'failed') return 'unreachable';
    return state.current === 'update waiting' || registration?.installing != null ? 'found' : 'none';
  };

  const reloadOnce = () => {
    stop.abort();
    if (patience !== null) window.clearTimeout(patience);
    window.location.reload();
  };

  const onControllerChange = () => {
    const before = controller;
    controller = container?.controller ?? null;
    if (accepted) {
      reloadOnce();
      return;
    }
    // The first worker of a new tablet claims a page of its own version.
    if (before !== null) overtaken = true;
    void look();
  };

  const onReturn = () => {
    if (window.document.visibilityState === 'hidden') return;
    if (state.current === 'failed' || window.performance.now() - checkedMs >= checkEveryMs) void checkNow();
    else void look();
  };

  if (container !== undefined) {
    container.addEventListener('controllerchange', onControllerChange, { signal });
    window.document.addEventListener('visibilitychange', onReturn, { signal });
    window.addEventListener('online', onReturn, { signal });
    void register();
  }
  // A tablet that stays in view all day gives no other occasion.
  const timer = container === undefined ? null : window.setInterval(onReturn, checkEveryMs);

  return {
    get current() {
      return state.current;
    },
    subscribe: state.subscribe,
    checkNow,
    accept() {
      if (state.current !== 'update waiting') return;
      state.set('updating');
      accepted = true;
      if (overtaken || registrar === null) {
        reloadOnce();
        return;
      }
      patience = window.setTimeout(() => {
        accepted = false;
        void look();
      }, takeOverPatienceMs);
      registrar.messageSkipWaiting();
    },
    release() {
      stop.abort();
      if (timer !== null) window.clearInterval(timer);
      if (patience !== null) window.clearTimeout(patience);
    },
  };
}
