import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { instantOfLocal, type OffsetMinutesAt } from '../../../src/core/review/local-time.ts';
import { shiftWindow, type ShiftHours, type ShiftWindow } from '../../../src/core/review/shift-window.ts';
import { localText, zone } from './zones.ts';

const hourMs = 3_600_000;
const utc: OffsetMinutesAt = () => 0;
const berlin = zone('Europe/Berlin');
const at = (text: string) => Date.parse(`${text}Z`);

const threeShifts: ShiftHours[] = [
  { name: 'Early', from: '06:00', to: '14:00' },
  { name: 'Late', from: '14:00', to: '22:00' },
  { name: 'Night', from: '22:00', to: '06:00' },
];

const shown = ({ name, fromWallMs, toWallMs }: ShiftWindow, offset: OffsetMinutesAt) =>
  `${name ?? '-'} ${localText(fromWallMs, offset)} to ${localText(toWallMs, offset)}`;
const hoursIn = ({ fromWallMs, toWallMs }: ShiftWindow) => (toWallMs - fromWallMs) / hourMs;

describe('shift borders', () => {
  test('a shift of one day; its end belongs to the next', () => {
    const expected = 'Early 2026-03-02 06:00 to 2026-03-02 14:00';
    expect(shown(shiftWindow(threeShifts, at('2026-03-02T06:00'), utc), utc)).toBe(expected);
    expect(shown(shiftWindow(threeShifts, at('2026-03-02T13:59:59.999'), utc), utc)).toBe(expected);
    expect(shiftWindow(threeShifts, at('2026-03-02T14:00'), utc).name).toBe('Late');
  });

  test('a shift across midnight is one shift on both sides of it', () => {
    const expected = 'Night 2026-03-02 22:00 to 2026-03-03 06:00';
    expect(shown(shiftWindow(threeShifts, at('2026-03-02T23:30'), utc), utc)).toBe(expected);
    expect(shown(shiftWindow(threeShifts, at('2026-03-03T00:00'), utc), utc)).toBe(expected);
    expect(shown(shiftWindow(threeShifts, at('2026-03-03T05:59'), utc), utc)).toBe(expected);
  });

  test('by local time, in a zone that never changes', () => {
    const kathmandu: OffsetMinutesAt = () => 345;
    const window = shiftWindow(threeShifts, at('2026-03-02T00:15'), kathmandu);
    expect(shown(window, kathmandu)).toBe('Early 2026-03-02 06:00 to 2026-03-02 14:00');
    expect(window.fromWallMs).toBe(at('2026-03-02T00:15'));
  });

  test('outside all shift hours there is a window too, so that nothing is lost', () => {
    const [early] = threeShifts;
    const window = shiftWindow(early ? [early] : [], at('2026-03-02T23:00'), utc);
    expect(shown(window, utc)).toBe('- 2026-03-02 14:00 to 2026-03-03 06:00');
  });

  test('without shift hours, or with none that a clock can show, it is the local day', () => {
    const expected = '- 2026-03-02 00:00 to 2026-03-03 00:00';
    expect(shown(shiftWindow([], at('2026-03-02T23:00'), utc), utc)).toBe(expected);
    for (const wrong of ['25:00', '12:60', '24:01', '6:00', 'soon']) {
      const hours = [{ name: 'X', from: '00:00', to: wrong }];
      expect(shown(shiftWindow(hours, at('2026-03-02T23:00'), utc), utc)).toBe(expected);
    }
  });

  test('24:00 is the end of the day, and equal borders are a whole day', () => {
    const evening = [{ name: 'Evening', from: '18:00', to: '24:00' }];
    expect(hoursIn(shiftWindow(evening, at('2026-03-02T20:00'), utc))).toBe(6);
    const whole = [{ name: 'Day', from: '07:00', to: '07:00' }];
    const expected = 'Day 2026-03-01 07:00 to 2026-03-02 07:00';
    expect(shown(shiftWindow(whole, at('2026-03-02T06:59'), utc), utc)).toBe(expected);
  });

  test('where hours overlap, the shift that began later has taken over', () => {
    const overlapping = [
      { name: 'Early', from: '06:00', to: '14:30' },
      { name: 'Late', from: '14:00', to: '22:30' },
    ];
    const expected = 'Early 2026-03-02 06:00 to 2026-03-02 14:00';
    expect(shown(shiftWindow(overlapping, at('2026-03-02T13:00'), utc), utc)).toBe(expected);
    expect(shiftWindow(overlapping, at('2026-03-02T14:15'), utc).name).toBe('Late');
  });

  test('where hours begin together, the one listed first holds until its end', () => {
    const together = [
      { name: 'Short', from: '06:00', to: '10:00' },
      { name: 'Long', from: '06:00', to: '14:00' },
    ];
    expect(shown(shiftWindow(together, at('2026-03-02T07:00'), utc), utc)).toBe(
      'Short 2026-03-02 06:00 to 2026-03-02 10:00',
    );
    expect(shown(shiftWindow(together, at('2026-03-02T11:00'), utc), utc)).toBe(
      'Long 2026-03-02 10:00 to 2026-03-02 14:00',
    );
  });

  test('a shift that another one interrupts has a window on each side of it', () => {
    const hours = [
      { name: 'Day', from: '06:00', to: '22:00' },
      { name: 'Audit', from: '10:00', to: '12:00' },
    ];
    const expected = 'Day 2026-03-02 12:00 to 2026-03-02 22:00';
    expect(shown(shiftWindow(hours, at('2026-03-02T13:00'), utc), utc)).toBe(expected);
  });
});

// Europe/Berlin: 2026-03-29 02:00 becomes 03:00; 2026-10-25 03:00 becomes 02:00 (EU directive 2000/84/EC: both at 01:00 UTC).
describe('the two nights on which clocks change', () => {
  test('spring: the night shift has 7 hours, the day 23', () => {
    const night = shiftWindow(threeShifts, at('2026-03-29T01:30'), berlin);
    expect(shown(night, berlin)).toBe('Night 2026-03-28 22:00 to 2026-03-29 06:00');
    expect(hoursIn(night)).toBe(7);
    expect(hoursIn(shiftWindow([], at('2026-03-29T12:00'), berlin))).toBe(23);
  });

  test('autumn: the night shift has 9 hours, the day 25', () => {
    const night = shiftWindow(threeShifts, at('2026-10-25T00:30'), berlin);
    expect(shown(night, berlin)).toBe('Night 2026-10-24 22:00 to 2026-10-25 06:00');
    expect(hoursIn(night)).toBe(9);
    expect(hoursIn(shiftWindow([], at('2026-10-25T12:00'), berlin))).toBe(25);
  });

  const halves: ShiftHours[] = [
    { name: 'First', from: '14:30', to: '02:30' },
    { name: 'Second', from: '02:30', to: '14:30' },
  ];

  test('spring: a border in the hour that is left out is the jump', () => {
    const jump = at('2026-03-29T01:00');
    expect(shiftWindow(halves, jump - 1, berlin)).toMatchObject({ name: 'First', toWallMs: jump });
    expect(shiftWindow(halves, jump, berlin)).toMatchObject({ name: 'Second', fromWallMs: jump });
  });

  test('spring: a shift that lies in the hour that is left out does not happen that day', () => {
    const within = [{ name: 'Check', from: '02:10', to: '02:40' }];
    const expected = '- 2026-03-28 02:40 to 2026-03-30 02:10';
    expect(shown(shiftWindow(within, at('2026-03-28T12:00'), berlin), berlin)).toBe(expected);
    expect(shown(shiftWindow(within, at('2026-03-29T12:00'), berlin), berlin)).toBe(expected);
  });

  test('autumn: a border in the hour that comes twice is in the first of the two, once', () => {
    const first = at('2026-10-25T00:30');
    expect(shiftWindow(halves, first - 1, berlin)).toMatchObject({ name: 'First', toWallMs: first });
    for (const later of [first, at('2026-10-25T01:15'), at('2026-10-25T01:45')]) {
      expect(shiftWindow(halves, later, berlin)).toMatchObject({ name: 'Second', fromWallMs: first });
    }
  });

  test('a zone of half-hour changes, and one whose day has no midnight', () => {
    const lordHowe = zone('Australia/Lord_Howe');
    // 2026-04-05: 02:00 becomes 01:30
    expect(hoursIn(shiftWindow([], at('2026-04-05T03:00'), lordHowe))).toBe(24.5);
    const cairo = zone('Africa/Cairo');
    // 2024-04-26: 00:00 becomes 01:00
    const day = shiftWindow([], at('2024-04-26T12:00'), cairo);
    expect(shown(day, cairo)).toBe('- 2024-04-26 01:00 to 2024-04-27 00:00');
  });
});

const clockTime = fc
  .tuple(fc.nat(23), fc.nat(59))
  .map((pair) => pair.map((part) => String(part).padStart(2, '0')).join(':'));
const anyShifts = fc.array(fc.record({ name: fc.constantFrom('A', 'B', 'C'), from: clockTime, to: clockTime }), {
  maxLength: 4,
});
/** A zone of the test's own that springs forward and falls back within two days. */
const madeUp: OffsetMinutesAt = (wallMs) =>
  wallMs < at('2026-05-10T01:00') ? 60 : wallMs < at('2026-05-20T01:00') ? 120 : 60;
const zones = fc.constantFrom(utc, madeUp, berlin);
const nearChanges = fc
  .constantFrom('2026-05-10T01:00', '2026-05-20T01:00', '2026-03-29T01:00', '2026-10-25T01:00')
  .chain((change) => fc.integer({ min: -40, max: 40 }).map((quarters) => at(change) + quarters * (hourMs / 4)));

describe('laws of shift windows', () => {
  test('the window holds its instant, and its neighbours join on without gap or overlap', () => {
    fc.assert(
      fc.property(anyShifts, nearChanges, zones, (shifts, wallMs, offset) => {
        const window = shiftWindow(shifts, wallMs, offset);
        expect(window.fromWallMs).toBeLessThanOrEqual(wallMs);
        expect(window.toWallMs).toBeGreaterThan(wallMs);
        for (const inside of [window.fromWallMs, Math.floor((window.fromWallMs + window.toWallMs) / 2)]) {
          expect(shiftWindow(shifts, inside, offset)).toEqual(window);
        }
        expect(shiftWindow(shifts, window.toWallMs, offset).fromWallMs).toBe(window.toWallMs);
        expect(shiftWindow(shifts, window.fromWallMs - 1, offset).toWallMs).toBe(window.fromWallMs);
      }),
      { numRuns: 150 },
    );
  });

  test('an instant of a local time shows that time, or is the jump over it', () => {
    fc.assert(
      fc.property(nearChanges, zones, (localMs, offset) => {
        const shownMs = (wallMs: number) => wallMs + offset(wallMs) * 60_000;
        const instant = instantOfLocal(localMs, offset);
        expect(shownMs(instant)).toBeGreaterThanOrEqual(localMs);
        expect(shownMs(instant - 1)).toBeLessThan(localMs);
        if (shownMs(instant) > localMs) expect(shownMs(instant) - shownMs(instant - 1)).toBeGreaterThan(1);
      }),
      { numRuns: 300 },
    );
  });
});
