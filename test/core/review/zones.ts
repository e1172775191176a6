import type { OffsetMinutesAt } from '../../../src/core/review/local-time.ts';

/** Offsets of a real zone, as the platform's own calendar tells them. */
export function zone(timeZone: string): OffsetMinutesAt {
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    hourCycle: 'h23',
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    second: 'numeric',
  });
  return (wallMs) => {
    const wholeMs = Math.floor(wallMs / 1000) * 1000;
    const part = Object.fromEntries(format.formatToParts(wholeMs).map(({ type, value }) => [type, Number(value)]));
    const { year = 0, month = 1, day = 1, hour = 0, minute = 0, second = 0 } = part;
    return (Date.UTC(year, month - 1, day, hour, minute, second) - wholeMs) / 60_000;
  };
}

/** Local time "YYYY-MM-DD HH:MM", of an instant. */
export function localText(wallMs: number, offsetMinutesAt: OffsetMinutesAt): string {
  return new Date(wallMs + offsetMinutesAt(wallMs) * 60_000).toISOString().slice(0, 16).replace('T', ' ');
}
