import { observed, type Capability } from './capability.ts';

declare global {
  interface Navigator {
    /** Only in browsers of one maker, so not in the DOM types. */
    readonly standalone?: boolean;
  }
}

/**
 * Installed: opened from the home screen. Clearable tab: a browser tab on a tablet whose browser deletes a site's data
 * after 7 days of use without a visit; a shift must not begin there without a warning.
 */
export type DisplayState = 'installed' | 'tab' | 'clearable tab';

export interface DisplayQuery extends EventTarget {
  readonly matches: boolean;
}

export interface DisplayWindow {
  readonly navigator: { readonly standalone?: boolean };
  matchMedia(query: string): DisplayQuery;
}

const installedModes = '(display-mode: standalone), (display-mode: fullscreen), (display-mode: minimal-ui)';

export function createDisplay(window: DisplayWindow = globalThis.window): Capability<DisplayState> {
  const query = window.matchMedia(installedModes);
  const look = (): DisplayState => {
    const { standalone } = window.navigator;
    if (query.matches || standalone === true) return 'installed';
    // Only the browsers with the 7-day rule have `standalone`: a feature, not a name, tells them.
    return standalone === false ? 'clearable tab' : 'tab';
  };
  const state = observed(look());
  const stop = new AbortController();
  query.addEventListener('change', () => state.set(look()), { signal: stop.signal });
  return {
    get current() {
      return state.current;
    },
    subscribe: state.subscribe,
    release: () => stop.abort(),
  };
}
