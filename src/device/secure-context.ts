import { failed, ok, type Result } from '../core/unit/result.ts';
import { serviceWorkerUrl } from './service-worker-message.ts';

/**
 * The four conditions for working offline, in the order in which they are tried:
 * `not secure`: the page came over plain http from another machine;
 * `no service worker`: the browser has none, or has it switched off;
 * `registration refused`: what a certificate warning that was clicked through looks like;
 * `nothing kept`: the page's own file could not be read back from the cache.
 */
export type OfflineHindrance = 'not secure' | 'no service worker' | 'registration refused' | 'nothing kept';

export interface OfflineCheckWindow {
  readonly isSecureContext: boolean;
  readonly document: { readonly baseURI: string };
  readonly navigator: {
    readonly serviceWorker?: {
      register(url: string, options: { updateViaCache: 'none' }): Promise<unknown>;
      readonly ready: Promise<unknown>;
    };
  };
  readonly caches?: { match(url: string, options: { ignoreSearch: true }): Promise<Response | undefined> };
  setTimeout(handler: () => void, ms: number): unknown;
}

/** Tries everything that the first offline start needs, while the server can still be reached. Takes up to `patienceMs`. */
export async function checkOffline(
  window: OfflineCheckWindow = globalThis.window,
  patienceMs = 30_000,
): Promise<Result<null, OfflineHindrance>> {
  if (!window.isSecureContext) return failed('not secure');
  const { serviceWorker } = window.navigator;
  if (serviceWorker === undefined || window.caches === undefined) return failed('no service worker');
  try {
    await serviceWorker.register(serviceWorkerUrl(window.document.baseURI), { updateViaCache: 'none' });
  } catch {
    return failed('registration refused');
  }
  const outOfPatience = new Promise((resolve) => window.setTimeout(() => resolve('late'), patienceMs));
  // `ready` never rejects: an install that fails leaves it open for ever.
  if ((await Promise.race([serviceWorker.ready, outOfPatience])) === 'late') return failed('nothing kept');
  const page = new URL('./', window.document.baseURI).href;
  const kept = await window.caches.match(page, { ignoreSearch: true }).catch(() => undefined);
  const text = await kept?.text().catch(() => '');
  return text === undefined || text === '' ? failed('nothing kept') : ok(null);
}
