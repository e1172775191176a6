/**
 * Hybrid logical clock (Kulkarni, Demirbas, Madappa, Avva and Leone, "Logical Physical Clocks", OPODIS 2014) as text
 * that sorts: 13 digits of ms since 1970, a point, 5 digits of a counter. It orders entries and does nothing else.
 */

const msDigits = 13;
const counterDigits = 5;
const counterLimit = 10 ** counterDigits;
/** A wall clock is believed up to here, so that counters that carry over find room below 14 digits. */
const highestWallMs = 10 ** msDigits - 1001;

export const timePattern = /^\d{13}\.\d{5}$/;

interface Reading {
  readonly ms: number;
  readonly counter: number;
}

function read(time: string): Reading {
  if (!timePattern.test(time)) throw new RangeError(`"${time}" is not 13 digits, a point and 5 digits`);
  return { ms: Number(time.slice(0, msDigits)), counter: Number(time.slice(msDigits + 1)) };
}

function write({ ms, counter }: Reading): string {
  if (counter === counterLimit) return write({ ms: ms + 1, counter: 0 });
  return `${String(ms).padStart(msDigits, '0')}.${String(counter).padStart(counterDigits, '0')}`;
}

/** The send rule: the time of a log's next entry, after its `last` and not before `wallMs`. */
export function nextTime(last: string | null, wallMs: number): string {
  return nextTimeAfter(last, null, wallMs);
}

/**
 * The receive rule: the time of a log's next entry, after its `last`, after what was `seen` of other logs, and not
 * before `wallMs`. Throws a RangeError where a text is no such time.
 */
export function nextTimeAfter(last: string | null, seen: string | null, wallMs: number): string {
  const wall = Math.min(highestWallMs, Math.max(0, Math.floor(wallMs)));
  const known = [last, seen].filter((time) => time !== null).map(read);
  const ms = Math.max(wall, ...known.map((reading) => reading.ms));
  const counters = known.filter((reading) => reading.ms === ms).map((reading) => reading.counter);
  return write({ ms, counter: Math.max(-1, ...counters) + 1 });
}

/** The latest of several times; null of none. */
export function latestTime(times: Iterable<string>): string | null {
  let latest: string | null = null;
  for (const time of times) if (latest === null || time > latest) latest = time;
  return latest;
}
