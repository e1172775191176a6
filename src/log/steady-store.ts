import type { Line } from '../core/event/entry.ts';
import { asStoreError, NotSavedError, StoreError, type Doing } from './errors.ts';
import type { Gone, LogStore, OpenStore } from './store.ts';
import { realAfter, watched, type After } from './watchdog.ts';

/** How long a store may take to answer, in ms. */
export const patienceMs = { open: 3000, write: 3000, read: 15000 } as const;

export interface SteadyStore extends LogStore {
  /** Rejects with a NotSavedError after the second failure. Appends are written one after the other. */
  append: LogStore['append'];
  /** Lines of failed appends that are not known to be saved, oldest first. */
  unsaved(): readonly Line[];
}

export interface SteadyOptions {
  readonly after?: After;
  /** Called when the store under it is closed from outside; the next use opens it anew. */
  readonly gone?: (why: Gone) => void;
}

interface Connection {
  readonly opening: Promise<LogStore>;
  /** As `opening`, but with a limit to the waiting. */
  readonly ready: Promise<LogStore>;
}

/**
 * A store that survives its connection: a handle that does not answer, or that the browser lost, is thrown away, a new one
 * is opened, and what was asked is tried once more. That is harmless for an append: lines already there count as saved.
 */
export function steadyStore(open: OpenStore, { after = realAfter, gone = () => {} }: SteadyOptions = {}): SteadyStore {
  let connection: Connection | null = null;
  let isClosed = false;
  let lastAppend: Promise<unknown> = Promise.resolve();
  const unsaved = new Map<string, Line>();

  function connect(): Connection {
    if (isClosed) throw new StoreError({ kind: 'broken', doing: 'open', name: 'closed' });
    if (connection !== null) return connection;
    const opening = open((why) => {
      discard(made);
      gone(why);
    });
    const made = { opening, ready: watched(opening, 'open', patienceMs.open, after) };
    connection = made;
    return made;
  }

  function discard(dead: Connection | null): void {
    if (connection === dead) connection = null;
    // Also a connection that is only now on its way: left open, it would block the next version.
    dead?.opening.then(
      (store) => store.close(),
      () => {},
    );
  }

  async function tryOnce<Value>(doing: Exclude<Doing, 'open' | 'remove'>, use: (store: LogStore) => Promise<Value>) {
    const current = connect();
    try {
      return await watched(use(await current.ready), doing, patienceMs[doing], after);
    } catch (error) {
      const told = asStoreError(error, doing);
      if (told instanceof StoreError && told.fault.kind !== 'full') discard(current);
      throw told;
    }
  }

  async function steadily<Value>(
    doing: Exclude<Doing, 'open' | 'remove'>,
    use: (store: LogStore) => Promise<Value>,
  ): Promise<Value> {
    try {
      return await tryOnce(doing, use);
    } catch (error) {
      const another = error instanceof StoreError && (error.fault.kind === 'silent' || error.fault.kind === 'broken');
      if (!another) throw error;
      return await tryOnce(doing, use);
    }
  }

  async function appendInTurn(...asked: Parameters<LogStore['append']>) {
    const [, lines] = asked;
    try {
      const appended = await steadily('write', (store) => store.append(...asked));
      if (appended === 'saved') for (const line of lines) unsaved.delete(line.text);
      return appended;
    } catch (error) {
      if (!(error instanceof StoreError)) throw error;
      for (const line of lines) unsaved.set(line.text, line);
      throw new NotSavedError(error.fault, lines, error);
    }
  }

  return {
    heads: () => steadily('read', (store) => store.heads()),
    append: (...asked) => {
      const appended = lastAppend.then(() => appendInTurn(...asked));
      lastAppend = appended.catch(() => {});
      return appended;
    },
    linesOfBatch: (batch) => steadily('read', (store) => store.linesOfBatch(batch)),
    lines: (from, most) => steadily('read', (store) => store.lines(from, most)),
    derived: (prefix) => steadily('read', (store) => store.derived(prefix)),
    derivedBetween: (fromKey, toKey) => steadily('read', (store) => store.derivedBetween(fromKey, toKey)),
    putDerived: (rows) => steadily('write', (store) => store.putDerived(rows)),
    count: () => steadily('read', (store) => store.count()),
    close: () => {
      isClosed = true;
      discard(connection);
    },
    unsaved: () => [...unsaved.values()],
  };
}
