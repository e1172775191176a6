import type { Draft, Head, Line } from '../../../src/core/event/entry.ts';
import { makeLines, type Stamp } from '../../../src/core/event/line.ts';

/** Tuesday 2 December 2025, 12:00 UTC, in ms since 1970. */
export const noonMs = 1_764_676_800_000;

export const stamp: Stamp = {
  log: 'log-a',
  wall: noonMs,
  mono: 1000,
  page: 'page-1',
  offset: 60,
  zone: 'Europe/Berlin',
  by: 'MK',
  seen: null,
};

export const started: Draft = { batch: 'bench', type: 'tabletStarted', v: 1, data: { app: '0.1.0' } };

export const held = (batch: string, reason: string): Draft => ({ batch, type: 'batchHeld', v: 1, data: { reason } });

/** Lines of one log, one append per draft, a second apart on both clocks. */
export function written(drafts: readonly Draft[], from: Partial<Stamp> = {}): { lines: Line[]; head: Head | null } {
  let head: Head | null = null;
  const lines: Line[] = [];
  drafts.forEach((draft, index) => {
    const base = { ...stamp, ...from };
    const made = makeLines(head, [draft], { ...base, wall: base.wall + index * 1000, mono: base.mono + index * 1000 });
    lines.push(...made.lines);
    head = made.head;
  });
  return { lines, head };
}
