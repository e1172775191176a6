/**
 * One thing that the device can do, as a small object. `subscribe` calls the listener at once and then on every
 * change, as a Svelte store does; `release` lets go of every listener, timer and handle.
 */
export interface Capability<State> {
  readonly current: State;
  subscribe(listener: (state: State) => void): () => void;
  release(): void;
}

/** A value that tells its listeners when it changed. */
export interface Observed<State> {
  readonly current: State;
  set(state: State): void;
  subscribe(listener: (state: State) => void): () => void;
}

/** `same` says when a new state is no news. */
export function observed<State>(initial: State, same: (a: State, b: State) => boolean = Object.is): Observed<State> {
  const listeners = new Set<(state: State) => void>();
  let current = initial;
  return {
    get current() {
      return current;
    },
    set(state) {
      if (same(current, state)) return;
      current = state;
      for (const listener of [...listeners]) listener(state);
    },
    subscribe(listener) {
      // Wrapped, so that one function subscribed twice is two subscriptions.
      const own = (state: State) => listener(state);
      listeners.add(own);
      listener(current);
      return () => void listeners.delete(own);
    },
  };
}

/** What counts as a tap: a finger lifted, or a key, since a foot pedal is a keyboard. */
export const tapEvents = ['pointerup', 'keydown'] as const;
