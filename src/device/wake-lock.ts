import { observed, tapEvents, type Capability } from './capability.ts';

/** Refused: the device said no (low battery, a policy) or took the lock back; asked again at the next tap. */
export type WakeLockState = 'held' | 'refused' | 'absent' | 'released';

export interface WakeLock extends Capability<WakeLockState> {
  /** Keep the screen on from now until `letGo`. */
  hold(): void;
  letGo(): void;
}

export interface WakeLockHandle extends EventTarget {
  release(): Promise<void>;
}

export interface WakeLockWindow extends EventTarget {
  readonly document: EventTarget & { readonly visibilityState: DocumentVisibilityState };
  readonly navigator: { readonly wakeLock?: { request(type: 'screen'): Promise<WakeLockHandle> } };
}

/**
 * The browser drops the lock whenever the page is hidden, and some give it back only after a tap, so it is asked for
 * again at both.
 */
export function createWakeLock(window: WakeLockWindow = globalThis.window): WakeLock {
  const { document } = window;
  const locks = window.navigator.wakeLock;
  const state = observed<WakeLockState>(locks === undefined ? 'absent' : 'released');
  let wanted = false;
  let asking = false;
  let handle: WakeLockHandle | null = null;

  const drop = (held: WakeLockHandle) => void held.release().catch(() => undefined);

  const ask = async () => {
    if (locks === undefined || !wanted || asking || handle !== null || document.visibilityState === 'hidden') return;
    asking = true;
    try {
      const granted = await locks.request('screen');
      if (!wanted) {
        drop(granted);
        return;
      }
      handle = granted;
      granted.addEventListener('release', () => {
        if (handle !== granted) return;
        handle = null;
        state.set(document.visibilityState === 'hidden' ? 'released' : 'refused');
      });
      state.set('held');
    } catch {
      state.set(wanted ? 'refused' : 'released');
    } finally {
      asking = false;
    }
  };

  const stop = new AbortController();
  const again = () => void ask();
  document.addEventListener('visibilitychange', again, { signal: stop.signal });
  for (const type of tapEvents) window.addEventListener(type, again, { signal: stop.signal, capture: true });

  const letGo = () => {
    wanted = false;
    const held = handle;
    handle = null;
    if (held !== null) drop(held);
    if (locks !== undefined) state.set('released');
  };

  return {
    get current() {
      return state.current;
    },
    subscribe: state.subscribe,
    hold() {
      wanted = true;
      again();
    },
    letGo,
    release() {
      stop.abort();
      letGo();
    },
  };
}
