import type { Entry, EntryId } from './entry.ts';

type Ordered = Pick<Entry, 'time' | 'log' | 'seq'>;

const compareText = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

/** The one total order of entries: time, then log, then seq. */
export function compareEntries(a: Ordered, b: Ordered): number {
  return compareText(a.time, b.time) || compareText(a.log, b.log) || a.seq - b.seq;
}

/** Entries without those whose log and seq came before in the list. */
export function dedupe<Item extends EntryId>(entries: readonly Item[]): Item[] {
  const seen = new Map<string, Set<number>>();
  return entries.filter(({ log, seq }) => {
    const ofLog = seen.get(log) ?? new Set();
    if (ofLog.size === 0) seen.set(log, ofLog);
    return ofLog.size < ofLog.add(seq).size;
  });
}

/** A set of entries as the list that is folded: in total order, each once, however they arrived. */
export function inOrder<Item extends Ordered>(entries: readonly Item[]): Item[] {
  return dedupe([...entries].sort(compareEntries));
}
