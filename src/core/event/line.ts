import { failed, ok, type Result } from '../unit/result.ts';
import { benchOf, type ClockReading } from './bench-time.ts';
import { nextTimeAfter } from './clock.ts';
import type { Draft, Entry, Envelope, Head, Line } from './entry.ts';
import { envelopeSchema } from './envelope.ts';
import { factSchema } from './facts.ts';
import { hashOfNothing, sha256 } from './hash.ts';

/** A line is at most this long, in UTF-16 code units. */
export const longestLine = 1_000_000;

/** What the edge knows when it writes: its log, both clocks, place and person. */
export interface Stamp extends ClockReading, Pick<Envelope, 'log' | 'offset' | 'zone' | 'by'> {
  /** The latest `time` read from any other log, so that new entries come after it; null where there is none. */
  readonly seen: string | null;
}

export interface Damaged {
  readonly kind: 'damaged';
  readonly why: string;
}

/** Well formed, and of a type or version that this version does not know. */
export interface Unknown {
  readonly kind: 'unknown';
  readonly envelope: Envelope;
  readonly type: string;
  readonly v: number;
}

/** Why a line is no entry that this version can read. Its text stays as it is. */
export type LineProblem = Damaged | Unknown;

/**
 * Makes entries into lines of JSON text, once: this text is what is stored, hashed, exported and exchanged.
 * The clocks are kept in whole ms, rounded down, so that bench time never runs ahead of the page. Throws a RangeError
 * where there is nothing to write, where `head` is of another log, or where a line could not be read back.
 */
export function makeLines(head: Head | null, drafts: readonly Draft[], stamp: Stamp): { lines: Line[]; head: Head } {
  const reading = { wall: Math.floor(stamp.wall), mono: Math.floor(stamp.mono), page: stamp.page };
  if (head !== null && head.log !== stamp.log) throw new RangeError(`log ${stamp.log} has no head in log ${head.log}`);
  const lines: Line[] = [];
  let last = head;
  for (const draft of drafts) {
    const entry = entryAfter(last, draft, { ...stamp, ...reading });
    const text = JSON.stringify(entry);
    const read = parseLine(text);
    if (!read.ok) throw new RangeError(`a ${draft.type} could not be read back: ${problemText(read.error)}`);
    lines.push({ log: entry.log, seq: entry.seq, batch: entry.batch, text });
    last = headAfter(entry, text);
  }
  if (last === null || lines.length === 0) throw new RangeError('an append needs at least one entry');
  return { lines, head: last };
}

/** Property order here is the order of the text. */
function entryAfter(last: Head | null, draft: Draft, stamp: Stamp): Entry {
  const { batch, type, v, data } = draft;
  return {
    log: stamp.log,
    seq: (last?.seq ?? 0) + 1,
    time: nextTimeAfter(last?.time ?? null, stamp.seen, stamp.wall),
    bench: benchOf(last, draft, stamp),
    wall: stamp.wall,
    mono: stamp.mono,
    page: stamp.page,
    offset: stamp.offset,
    zone: stamp.zone,
    by: stamp.by,
    batch,
    type,
    v,
    data,
    prev: last?.hash ?? hashOfNothing,
  } as Entry;
}

/** Where a log stands after this entry, whose line is `text`. */
export function headAfter(entry: Envelope, text: string): Head {
  const { log, seq, time, bench, wall, mono, page } = entry;
  return { log, seq, hash: sha256(text), time, bench, wall, mono, page };
}

/** Reads a line. The entry is for folding only: it is never written back. Never throws. */
export function parseLine(text: string): Result<Entry, LineProblem> {
  if (text.length > longestLine) return damaged(`${text.length} characters; a line has at most ${longestLine}`);
  let parsed: unknown;
  try {
    parsed = JSON.parse(text);
  } catch {
    return damaged(`no JSON: "${text.slice(0, 40)}"`);
  }
  const envelope = envelopeSchema.safeParse(parsed);
  if (!envelope.success) return damaged(issueText(envelope.error.issues));
  const fact = factSchema.safeParse(parsed);
  if (fact.success) return ok(Object.assign(envelope.data, fact.data));
  const { type, v, ...known } = envelope.data;
  const isUnknown = fact.error.issues.some(({ path }) => path[0] === 'type' || path[0] === 'v');
  return isUnknown ? failed({ kind: 'unknown', envelope: known, type, v }) : damaged(issueText(fact.error.issues));
}

/** What a line says of itself, whether or not this version knows its type. */
export function envelopeOf(read: Result<Entry, LineProblem>): Result<Envelope, Damaged> {
  if (read.ok) return read;
  return read.error.kind === 'unknown' ? ok(read.error.envelope) : failed(read.error);
}

/** The line that a text of an export stands for; one of an unknown type is still a line. */
export function lineOf(text: string): Result<Line, Damaged> {
  const envelope = envelopeOf(parseLine(text));
  if (!envelope.ok) return envelope;
  const { log, seq, batch } = envelope.value;
  return ok({ log, seq, batch, text });
}

/** A problem as a phrase for a terminal or a test. */
export function problemText(problem: LineProblem): string {
  return problem.kind === 'damaged' ? problem.why : `unknown entry ${problem.type}, version ${problem.v}`;
}

const damaged = (why: string) => failed({ kind: 'damaged', why } as const);

function issueText(issues: readonly { readonly code?: string; readonly path: readonly PropertyKey[] }[]): string {
  const [first] = issues;
  return first === undefined ? 'not an entry' : `/${first.path.map(String).join('/')}: ${first.code ?? 'wrong'}`;
}
