import type { Draft, Head, Line } from '../../src/core/event/entry.ts';
import { makeLines } from '../../src/core/event/line.ts';

export const held = (batch: string, reason: string): Draft => ({ batch, type: 'batchHeld', v: 1, data: { reason } });

/** Lines for one append, made after `head`. */
export function linesAfter(head: Head | null, drafts: readonly Draft[], log = head?.log ?? 'log-a') {
  const stamp = {
    log,
    wall: 1_764_676_800_000 + (head?.seq ?? 0) * 1000,
    mono: (head?.seq ?? 0) * 1000,
    page: 'page-1',
    offset: 60,
    zone: 'Europe/Berlin',
    by: 'MK',
    seen: null,
  };
  const { lines, head: after } = makeLines(head, drafts, stamp);
  return { expected: head, lines, head: after };
}

export const textsOf = (lines: readonly Line[]): string[] => lines.map((line) => line.text);
