import { realAfter, type After } from './watchdog.ts';

/** `waiting`: another window writes. `lost`: another window took over from this one. */
export type WriterState = 'waiting' | 'writing' | 'lost';

/** How long the other window may take to let go before the lock is taken from it, in ms. */
export const answerMs = 3000;

const useHereMessage = 'use here';

export interface WriterOptions {
  /** Missing outside a secure context: then every window writes, and the store tells who was late. */
  readonly locks: Pick<LockManager, 'request'> | undefined;
  /** Shared by the windows of one database, and by nobody else. */
  readonly channel: Pick<BroadcastChannel, 'postMessage' | 'addEventListener' | 'close'>;
  readonly after?: After;
  readonly changed: (state: WriterState) => void;
  /** Finishes what is being written and closes the database; the other window begins after it. */
  readonly letGo: () => Promise<void> | void;
}

/** The right to write to one database: one window has it at a time. */
export interface Writer {
  readonly current: WriterState;
  /** Asks the other window to let go, and takes the right from it if it does not within `answerMs`. */
  useHere(): void;
  /** Gives the right back, or the place in the queue. */
  close(): void;
}

/** Resolves when it is known whether this window writes or waits. A waiting one goes on by itself when the other closes. */
export async function takeWriter(database: string, options: WriterOptions): Promise<Writer> {
  const writer = new LockWriter(`writer ${database}`, options);
  await writer.begin();
  return writer;
}

class LockWriter implements Writer {
  readonly #name: string;
  readonly #options: WriterOptions;
  #state: WriterState = 'waiting';
  #place: AbortController | null = null;
  #release: (() => void) | null = null;
  #cancelTaking: () => void = () => {};

  constructor(name: string, options: WriterOptions) {
    this.#name = name;
    this.#options = options;
    options.channel.addEventListener('message', (event) => {
      if (event.data === useHereMessage) void this.#giveWay();
    });
  }

  get current(): WriterState {
    return this.#state;
  }

  async begin(): Promise<void> {
    const { locks } = this.#options;
    if (locks === undefined) return this.#become('writing');
    const isFree = await new Promise<boolean>((answer) => {
      this.#request(locks, { ifAvailable: true }, answer);
    });
    if (isFree) return;
    this.#become('waiting');
    this.#queue(locks);
  }

  useHere(): void {
    const { locks, channel, after = realAfter } = this.#options;
    if (this.#state === 'writing' || locks === undefined) return;
    if (this.#place === null) this.#queue(locks);
    channel.postMessage(useHereMessage);
    this.#cancelTaking();
    this.#cancelTaking = after(answerMs, () => {
      this.#leaveQueue();
      this.#request(locks, { steal: true });
    });
  }

  close(): void {
    this.#cancelTaking();
    this.#leaveQueue();
    this.#options.channel.close();
    this.#release?.();
    this.#release = null;
    this.#state = 'lost';
  }

  #become(state: WriterState): void {
    this.#state = state;
    this.#options.changed(state);
  }

  #queue(locks: Pick<LockManager, 'request'>): void {
    this.#place = new AbortController();
    this.#request(locks, { signal: this.#place.signal });
  }

  #leaveQueue(): void {
    this.#place?.abort();
    this.#place = null;
  }

  #request(locks: Pick<LockManager, 'request'>, how: LockOptions, answer: (granted: boolean) => void = () => {}): void {
    let release: (() => void) | null = null;
    const held = locks.request(this.#name, how, (lock) => {
      answer(lock !== null);
      if (lock === null) return undefined;
      return new Promise<void>((resolve) => {
        release = resolve;
        this.#hold(resolve);
      });
    });
    // A request that was held and is rejected was stolen; one that only stood in the queue was withdrawn.
    held.catch(() => {
      answer(false);
      if (release !== null && this.#release === release) void this.#lose();
    });
  }

  #hold(release: () => void): void {
    this.#cancelTaking();
    this.#place = null;
    this.#release = release;
    this.#become('writing');
  }

  /** Another window asked: let go of the lock, or stand behind that window in the queue. */
  async #giveWay(): Promise<void> {
    const { locks } = this.#options;
    if (locks === undefined) return;
    if (this.#state === 'writing') return this.#lose();
    this.#cancelTaking();
    if (this.#place === null) return;
    this.#leaveQueue();
    this.#queue(locks);
  }

  async #lose(): Promise<void> {
    const release = this.#release;
    this.#release = null;
    this.#become('lost');
    try {
      await this.#options.letGo();
    } finally {
      release?.();
    }
  }
}
