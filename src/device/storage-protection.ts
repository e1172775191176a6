import { observed, type Capability } from './capability.ts';

export interface StorageState {
  /** Protected: the browser will not clear it by itself when the disk runs full. A person still can. */
  readonly protection: 'protected' | 'not protected' | 'unknown';
  /** Bytes that the browser says may still be written; null when it does not say. */
  readonly freeBytes: number | null;
}

export interface StorageProtection extends Capability<StorageState> {
  /** Reads the state without asking for anything. */
  look(): Promise<StorageState>;
  /** Asks for protection. Browsers grant it by use and by whether the app is installed, so ask again at every shift. */
  ask(): Promise<StorageState>;
}

export interface StorageWindow {
  readonly navigator: {
    readonly storage?: {
      persist?(): Promise<boolean>;
      persisted?(): Promise<boolean>;
      estimate?(): Promise<{ quota?: number; usage?: number }>;
    };
  };
}

const same = (a: StorageState, b: StorageState) => a.protection === b.protection && a.freeBytes === b.freeBytes;

export function createStorageProtection(window: StorageWindow = globalThis.window): StorageProtection {
  const { storage } = window.navigator;
  const state = observed<StorageState>({ protection: 'unknown', freeBytes: null }, same);

  const protection = async (question: (() => Promise<boolean>) | undefined): Promise<StorageState['protection']> => {
    if (question === undefined) return 'unknown';
    return question().then(
      (granted) => (granted ? 'protected' : 'not protected'),
      () => 'unknown',
    );
  };
  const freeBytes = async (): Promise<number | null> => {
    const estimate = await storage?.estimate?.().catch(() => undefined);
    if (estimate?.quota === undefined || estimate.usage === undefined) return null;
    return Math.max(0, estimate.quota - estimate.usage);
  };
  const learn = async (question: (() => Promise<boolean>) | undefined) => {
    state.set({ protection: await protection(question), freeBytes: await freeBytes() });
    return state.current;
  };

  return {
    get current() {
      return state.current;
    },
    subscribe: state.subscribe,
    look: () => learn(storage?.persisted?.bind(storage)),
    ask: () => learn(storage?.persist?.bind(storage)),
    // Holds nothing.
    release: () => undefined,
  };
}
