import { randomId, type RandomSource } from './random-id.ts';

/** Both clocks at one instant, in ms: `wall` since 1970 as the tablet shows it, `mono` since the page began. */
export interface ClockReading {
  readonly wall: number;
  readonly mono: number;
}

/** What an entry carries of its time: also the page it was read in, minutes east of UTC, and the IANA zone. */
export interface ClockStamp extends ClockReading {
  readonly page: string;
  readonly offset: number;
  readonly zone: string;
}

export interface Clock {
  /** Random name of this page's life; `mono` values of different pages cannot be compared. */
  readonly page: string;
  read(): ClockReading;
  stamp(): ClockStamp;
}

export interface ClockWindow {
  readonly Date: { new (ms: number): { getTimezoneOffset(): number }; now(): number };
  readonly performance: { now(): number };
  readonly Intl: { DateTimeFormat(): { resolvedOptions(): { timeZone: string } } };
  readonly crypto: RandomSource;
}

/** The zone's name is asked for again after so long: asking takes about as long as all else that an entry needs. */
const zoneLastsMs = 60_000;

/** Every read goes through the window, so that a test (or a browser test's fake clock) can stand in its place. */
export function createClock(window: ClockWindow = globalThis): Clock {
  const page = randomId(12, window.crypto);
  const read = (): ClockReading => ({ wall: window.Date.now(), mono: Math.round(window.performance.now()) });
  let zone = { name: '', offset: Number.NaN, askedAtMono: 0 };
  const zoneNow = (offset: number, mono: number): string => {
    if (offset !== zone.offset || mono - zone.askedAtMono >= zoneLastsMs) {
      const name = window.Intl.DateTimeFormat().resolvedOptions().timeZone;
      zone = { name, offset, askedAtMono: mono };
    }
    return zone.name;
  };
  return {
    page,
    read,
    stamp() {
      const { wall, mono } = read();
      // Zero minutes west must not become minus zero.
      const offset = 0 - new window.Date(wall).getTimezoneOffset();
      return { wall, mono, page, offset, zone: zoneNow(offset, mono) };
    },
  };
}
