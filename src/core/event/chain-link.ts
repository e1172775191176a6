import { failed, ok, type Result } from '../unit/result.ts';
import { benchOf } from './bench-time.ts';
import type { Head, Line } from './entry.ts';
import { hashOfNothing, sha256 } from './hash.ts';
import { envelopeOf, headAfter, parseLine } from './line.ts';

/** What does not fit at a line. */
export type ChainFault =
  /** Its text is no entry. */
  | 'damaged'
  /** It is stored under another log, seq or batch than its text says. */
  | 'filed wrongly'
  /** A line before it is not here. */
  | 'line missing'
  /** The line before it is not the one that it was written after. */
  | 'changed before'
  /** The same log and seq was here already with another text. */
  | 'two texts'
  /** Its time is not after that of the line before. */
  | 'time not rising'
  /** Its bench time does not follow from the line before. */
  | 'bench time wrong';

export interface ChainBreak {
  readonly fault: ChainFault;
  readonly why: string;
}

/**
 * Whether a line follows the log's head: the head after it, or `again` for a line that was here already.
 * `hashes` holds those of all lines so far, by seq - 1.
 */
export function checkLine(
  line: Line,
  head: Head | null,
  hashes: readonly string[],
): Result<Head | 'again', ChainBreak> {
  const read = parseLine(line.text);
  const said = envelopeOf(read);
  if (!said.ok) return broken('damaged', said.error.why);
  const envelope = said.value;
  const name = `line ${line.seq} of log ${line.log}`;
  if (envelope.log !== line.log || envelope.seq !== line.seq || envelope.batch !== line.batch) {
    return broken('filed wrongly', `${name} says log ${envelope.log}, seq ${envelope.seq}, batch ${envelope.batch}`);
  }
  const before = hashes[line.seq - 1];
  if (before !== undefined) {
    const same = before === sha256(line.text);
    return same ? ok('again') : broken('two texts', `${name} stands here with two different texts`);
  }
  const due = hashes.length + 1;
  if (line.seq !== due) return broken('line missing', `${name} comes where line ${due} is due`);
  const prev = head?.hash ?? hashOfNothing;
  if (envelope.prev !== prev) {
    return broken('changed before', `${name} was written after ${envelope.prev}; the line before it is ${prev}`);
  }
  if (head !== null && envelope.time <= head.time) {
    return broken('time not rising', `${name} has time ${envelope.time} after ${head.time}`);
  }
  const bench = read.ok ? benchOf(head, read.value, read.value) : envelope.bench;
  if (envelope.bench !== bench) {
    return broken('bench time wrong', `${name} has bench time ${envelope.bench}; its clocks give ${bench}`);
  }
  return ok(headAfter(envelope, line.text));
}

const broken = (fault: ChainFault, why: string) => failed({ fault, why });
