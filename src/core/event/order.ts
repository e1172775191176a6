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

/** Whether a list is in total order and, since the seqs of each log only rise along it, has no entry twice. */
function isInOrder(entries: readonly Ordered[]): boolean {
  const highest = new Map<string, number>();
  let before: Ordered | null = null;
  for (const entry of entries) {
    if (before !== null) {
      if (compareEntries(before, entry) > 0) return false;
      if (before.log !== entry.log) highest.set(before.log, before.seq);
    }
    const last: number = before?.log === entry.log ? before.seq : (highest.get(entry.log) ?? 0);
    if (entry.seq <= last) return false;
    before = entry;
  }
  return true;
}

/** A set of entries as the list that is folded: in total order, each once, however they arrived. */
export function inOrder<Item extends Ordered>(entries: readonly Item[]): Item[] {
  // Mostly they arrive in order, and to look is cheaper than to sort.
  return isInOrder(entries) ? [...entries] : dedupe([...entries].sort(compareEntries));
}
