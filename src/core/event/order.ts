import type { Entry, EntryId } from './entry.ts';

type Ordered = Pick<Entry, 'time' | 'log' | 'seq'>;

const compareText = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

/** The one total order of entries: time, then log, then seq. */
export function compareEntries(a: Ordered, b: Ordered): number {
  return compareText(a.time, b.time) || compareText(a.log, b.log) || a.seq - b.seq;
}

/** Whether the seqs of each log only rise along the list: then no entry is there twice. */
function seqsRise(entries: readonly EntryId[]): boolean {
  const highest = new Map<string, number>();
  let current = '';
  let last = -Infinity;
  for (const { log, seq } of entries) {
    if (log !== current) {
      highest.set(current, last);
      current = log;
      last = highest.get(log) ?? -Infinity;
    }
    if (seq <= last) return false;
    last = seq;
  }
  return true;
}

/** Entries without those whose log and seq came before in the list. */
export function dedupe<Item extends EntryId>(entries: readonly Item[]): Item[] {
  if (seqsRise(entries)) return [...entries];
  const seen = new Map<string, Set<number>>();
  return entries.filter(({ log, seq }) => {
    const ofLog = seen.get(log) ?? new Set();
    if (ofLog.size === 0) seen.set(log, ofLog);
    return ofLog.size < ofLog.add(seq).size;
  });
}

/** A set of entries as the list that is folded: in total order, each once, however they arrived. */
export function inOrder<Item extends Ordered>(entries: readonly Item[]): Item[] {
  // Mostly they arrive in order, and looking is cheaper than sorting.
  const isSorted = entries.every((entry, index) => {
    const before = entries[index - 1];
    return before === undefined || compareEntries(before, entry) <= 0;
  });
  return dedupe(isSorted ? entries : [...entries].sort(compareEntries));
}
