import { verify } from '../../../src/core/event/chain.ts';
import type { Head } from '../../../src/core/event/entry.ts';
import { NotSavedError } from '../../../src/log/errors.ts';
import { openIndexedDbStore } from '../../../src/log/indexed-db-store.ts';
import { steadyStore } from '../../../src/log/steady-store.ts';
import { takeWriter, type Writer } from '../../../src/log/writer.ts';
import { held, linesAfter } from '../../contract/lines-to-store.ts';

const store = steadyStore((gone) => openIndexedDbStore('windows', gone));
const headOf = async (log: string): Promise<Head | null> =>
  (await store.heads()).find((head) => head.log === log) ?? null;

/** Appends so many entries to one log that another window writes too; answers how often it came too late. */
export async function race(entries: number, who: string): Promise<number> {
  let moved = 0;
  for (let saved = 0; saved < entries;) {
    const { expected, lines, head } = linesAfter(await headOf('shared'), [held('b1', `${who} ${saved}`)], 'shared');
    if ((await store.append(expected, lines, head, [])) === 'saved') saved += 1;
    else moved += 1;
  }
  return moved;
}

export async function verified(): Promise<{ state: string | undefined; count: number; texts: number }> {
  const lines = await store.lines();
  const texts = new Set(lines.map(({ text }) => text)).size;
  return { state: verify(lines).get('shared')?.state, count: lines.length, texts };
}

/** From here on the page's databases stand in a storage bucket that holds so many bytes, so that it fills up. */
export async function keepWithin(quota: number): Promise<void> {
  const { storageBuckets } = navigator as Navigator & {
    storageBuckets: { open(name: string, options: { quota: number }): Promise<{ indexedDB: IDBFactory }> };
  };
  const bucket = await storageBuckets.open('small', { quota });
  Object.defineProperty(window, 'indexedDB', { value: bucket.indexedDB });
}

/** Appends about so many bytes; answers what became of it, in words. */
export async function appendBytes(bytes: number): Promise<{ said: string; unsaved: number; count: number }> {
  const lineBytes = 100_000;
  const text = `${bytes}${'x'.repeat(lineBytes)}`;
  const drafts = Array.from({ length: Math.ceil(bytes / lineBytes) }, () => ({
    batch: 'bench',
    type: 'recipeTaken' as const,
    v: 1 as const,
    data: { hash: 'a'.repeat(64), text },
  }));
  const { expected, lines, head } = linesAfter(await headOf('big'), drafts, 'big');
  const said = await store.append(expected, lines, head, []).catch((error: unknown) => {
    if (error instanceof NotSavedError) return error.message;
    throw error;
  });
  return { said, unsaved: store.unsaved().length, count: await store.count() };
}

let writer: Writer | null = null;
const told: string[] = [];

export async function startWriter(deaf: boolean): Promise<void> {
  writer = await takeWriter('windows', {
    locks: navigator.locks,
    channel: new BroadcastChannel(deaf ? 'nobody listens here' : 'writer windows'),
    changed: (state) => void told.push(state),
    letGo: () => void told.push('let go'),
  });
}

export const useHere = (): void => writer?.useHere();
export const toldWriter = (): readonly string[] => told;
