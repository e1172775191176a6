/** What a page says to its service worker. */
export type ServiceWorkerMessage =
  /** A person agreed to the new version: take over now. */
  | { readonly type: 'SKIP_WAITING' }
  /** Count what is kept, and clear away what only older versions used. Answered with a `Stock`. */
  | { readonly type: 'TAKE_STOCK'; readonly appVersion: string };

export interface Stock {
  /** Files that should be kept and are not; 0 means that everything opens offline. */
  readonly missing: number;
}

/** The worker lies beside the page; routes live behind `#`, so the document's base is the app's folder. */
export function serviceWorkerUrl(baseUri: string): string {
  return new URL('service-worker.js', baseUri).href;
}

const answerPatienceMs = 10_000;

export interface StockTimer {
  setTimeout(handler: () => void, ms: number): number;
  clearTimeout(timer: number): void;
}

export interface MessageTaker {
  postMessage(message: ServiceWorkerMessage, transfer: MessagePort[]): void;
}

/** Asks a worker to take stock; null when it does not answer within 10 s. */
export function askForStock(worker: MessageTaker, appVersion: string, timers: StockTimer): Promise<Stock | null> {
  return new Promise((resolve) => {
    const { port1, port2 } = new MessageChannel();
    const settle = (stock: Stock | null) => {
      timers.clearTimeout(timer);
      port1.close();
      resolve(stock);
    };
    const timer = timers.setTimeout(() => settle(null), answerPatienceMs);
    port1.onmessage = (event: MessageEvent<Stock>) => settle(event.data);
    worker.postMessage({ type: 'TAKE_STOCK', appVersion }, [port2]);
  });
}
