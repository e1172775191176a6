import type { EntryId, Head, Line } from './entry.ts';
import { checkLine, type ChainFault } from './chain-link.ts';

/** A head that was written down elsewhere: on an export's last line, on a printed hand-over. */
export type KnownHead = Pick<Head, 'log' | 'seq' | 'hash'>;

/** What can be said of one log. Unbroken to an end that nobody confirmed may still lack its last lines. */
export type LogReport =
  | { readonly state: 'unbroken'; readonly head: Head; readonly end: 'confirmed' | 'not confirmed' }
  /** Its lines end before the known head. */
  | { readonly state: 'cut'; readonly head: Head | null; readonly known: KnownHead }
  /** Another line stands where the known head was. */
  | { readonly state: 'other history'; readonly head: Head; readonly known: KnownHead }
  | { readonly state: 'broken'; readonly at: EntryId; readonly fault: ChainFault; readonly why: string };

interface Walk {
  /** Hash of each line so far, by seq - 1. */
  readonly hashes: string[];
  head: Head | null;
  broken: Extract<LogReport, { state: 'broken' }> | null;
}

/** Checks lines as they come, so that a log of any length is verified page by page. */
export class ChainCheck {
  readonly #walks = new Map<string, Walk>();

  /** The next line. Lines of one log come by seq; logs may alternate; the same line may come again. */
  add(line: Line): void {
    const walk = this.#walks.get(line.log) ?? { hashes: [], head: null, broken: null };
    this.#walks.set(line.log, walk);
    if (walk.broken !== null) return;
    const link = checkLine(line, walk.head, walk.hashes);
    if (!link.ok) {
      walk.broken = { state: 'broken', at: { log: line.log, seq: line.seq }, ...link.error };
    } else if (link.value !== 'again') {
      walk.head = link.value;
      walk.hashes.push(link.value.hash);
    }
  }

  /** One report per log; a known head confirms or refutes how far its log goes. */
  reports(known: readonly KnownHead[] = []): Map<string, LogReport> {
    const logs = new Set([...this.#walks.keys(), ...known.map((head) => head.log)]);
    return new Map([...logs].map((log) => [log, report(this.#walks.get(log), latestOf(known, log))]));
  }
}

/** Verifies whole logs at once: what is unbroken and to where, or the first line that does not fit and why. */
export function verify(lines: Iterable<Line>, known: readonly KnownHead[] = []): Map<string, LogReport> {
  const check = new ChainCheck();
  for (const line of lines) check.add(line);
  return check.reports(known);
}

function latestOf(known: readonly KnownHead[], log: string): KnownHead | null {
  const own = known.filter((head) => head.log === log);
  return own.reduce<KnownHead | null>((latest, head) => (latest && latest.seq >= head.seq ? latest : head), null);
}

function report(walk: Walk | undefined, known: KnownHead | null): LogReport {
  if (walk?.broken) return walk.broken;
  const head = walk?.head ?? null;
  if (known !== null && (head === null || head.seq < known.seq)) return { state: 'cut', head, known };
  if (head === null) throw new RangeError('a log without lines and without a known head has no report');
  if (known === null) return { state: 'unbroken', head, end: 'not confirmed' };
  if (walk?.hashes[known.seq - 1] !== known.hash) return { state: 'other history', head, known };
  return { state: 'unbroken', head, end: known.seq === head.seq ? 'confirmed' : 'not confirmed' };
}
