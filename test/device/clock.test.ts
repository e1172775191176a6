import { expect, test } from 'vitest';
import { createClock, type ClockWindow } from '../../src/device/clock.ts';

const fakeClockWindow = (wall: number, mono: number, minutesWest: number, seed = 7): ClockWindow => ({
  Date: class {
    static now() {
      return wall;
    }
    constructor(readonly ms: number) {}
    getTimezoneOffset() {
      return this.ms === wall ? minutesWest : Number.NaN;
    }
  },
  performance: { now: () => mono },
  Intl: { DateTimeFormat: () => ({ resolvedOptions: () => ({ timeZone: 'Europe/Berlin' }) }) },
  crypto: { getRandomValues: (bytes) => bytes.fill(seed) },
});

test('a stamp carries both clocks, the page and the zone', () => {
  const clock = createClock(fakeClockWindow(1_777_881_600_000, 1234.56, -120));
  expect(clock.stamp()).toEqual({
    wall: 1_777_881_600_000,
    mono: 1235,
    page: '777777777777',
    offset: 120,
    zone: 'Europe/Berlin',
  });
  expect(clock.read()).toEqual({ wall: 1_777_881_600_000, mono: 1235 });
});

test('minutes east of UTC: west is negative, and Greenwich is a plain zero', () => {
  expect(createClock(fakeClockWindow(0, 0, 300)).stamp().offset).toBe(-300);
  expect(Object.is(createClock(fakeClockWindow(0, 0, 0)).stamp().offset, 0)).toBe(true);
});

test('the zone is asked for again when the offset changed, and after a minute', () => {
  let now = { mono: 0, minutesWest: -60, zone: 'Europe/Berlin' };
  let asked = 0;
  const window: ClockWindow = {
    ...fakeClockWindow(0, 0, 0),
    Date: class {
      static now = () => 0;
      getTimezoneOffset = () => now.minutesWest;
    },
    performance: { now: () => now.mono },
    Intl: { DateTimeFormat: () => ({ resolvedOptions: () => ({ timeZone: (asked += 1) > 0 ? now.zone : '' }) }) },
  };
  const clock = createClock(window);
  const zones = [];
  for (const next of [
    {},
    { mono: 59_999 },
    { minutesWest: 0, zone: 'Europe/London' },
    { zone: 'UTC' },
    { mono: 119_999 },
  ]) {
    now = { ...now, ...next };
    zones.push(clock.stamp().zone);
  }
  expect(zones).toEqual(['Europe/Berlin', 'Europe/Berlin', 'Europe/London', 'Europe/London', 'UTC']);
  expect(asked).toBe(3);
});

test('the real window serves as it is', () => {
  const stamp = createClock().stamp();
  expect(stamp.page).toHaveLength(12);
  expect(Number.isInteger(stamp.mono)).toBe(true);
  expect(stamp.zone).not.toBe('');
});
