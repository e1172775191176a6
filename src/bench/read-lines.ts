import type { Entry } from '../core/event/entry.ts';
import { parseLine, type LineProblem } from '../core/event/line.ts';
import { inOrder } from '../core/event/order.ts';

/** A stored line that this version cannot read. Nothing is done to it. */
export interface Unreadable {
  /** Among whose lines it stands: a batch, or "bench". */
  readonly batch: string;
  readonly text: string;
  readonly problem: LineProblem;
}

export interface ReadLines {
  readonly entries: Entry[];
  readonly unreadable: Unreadable[];
}

/** Lines of one batch as entries in total order; what cannot be read is kept apart and named. */
export function readLines(texts: readonly string[], batch: string): ReadLines {
  return readRows(texts.map((text) => ({ batch, text })));
}

/** The same of lines from anywhere. */
export function readRows(rows: readonly { readonly batch: string; readonly text: string }[]): ReadLines {
  const entries: Entry[] = [];
  const unreadable: Unreadable[] = [];
  for (const { batch, text } of rows) {
    const read = parseLine(text);
    if (read.ok) entries.push(read.value);
    else unreadable.push({ batch, text, problem: read.error });
  }
  return { entries: inOrder(entries), unreadable };
}
