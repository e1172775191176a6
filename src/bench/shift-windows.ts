import type { OffsetMinutesAt } from '../core/review/local-time.ts';
import { shiftWindow, type ShiftHours, type ShiftWindow } from '../core/review/shift-window.ts';

const mostBack = 2;

/**
 * The shift that runs, and those before it to choose from: the previous one, and where that is only the time between
 * shifts, the one before it too.
 */
export function shiftChoices(
  shifts: readonly ShiftHours[],
  wallMs: number,
  offsetMinutesAt: OffsetMinutesAt,
): readonly ShiftWindow[] {
  const windows = [shiftWindow(shifts, wallMs, offsetMinutesAt)];
  for (let back = 0; back < mostBack; back += 1) {
    const earliest = windows.at(-1);
    if (!earliest) break;
    const before = shiftWindow(shifts, earliest.fromWallMs - 1, offsetMinutesAt);
    windows.push(before);
    if (before.name !== null || shifts.length === 0) break;
  }
  return windows;
}
