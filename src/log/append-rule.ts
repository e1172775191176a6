import type { Head, Line } from '../core/event/entry.ts';

/** Whether a log still stands where its next lines were made. */
export function standsAt(expected: Head | null, stored: Head | null): boolean {
  return expected?.seq === stored?.seq && expected?.hash === stored?.hash;
}

/** Throws a RangeError for an append that no store may take: of two logs, with a gap, or with another line's head. */
export function checkAppend(expected: Head | null, lines: readonly Line[], head: Head): void {
  const before = expected?.seq ?? 0;
  const inRow = lines.every((line, index) => line.log === head.log && line.seq === before + 1 + index);
  const sameLog = expected === null || expected.log === head.log;
  if (lines.length === 0 || !inRow || !sameLog || head.seq !== before + lines.length) {
    const given = lines.map((line) => `${line.log} ${line.seq}`).join(', ');
    throw new RangeError(`after ${head.log} ${before} cannot come [${given}] with head ${head.log} ${head.seq}`);
  }
}
