import { dayMs, instantOfLocal, localMsOf, type OffsetMinutesAt } from './local-time.ts';

/** Hours of a shift by the clock on the wall, "HH:MM"; one that ends at or before its start ends the next day. */
export interface ShiftHours {
  readonly name: string;
  readonly from: string;
  readonly to: string;
}

export interface ShiftWindow {
  /** Null outside all shift hours, and for the whole day where no hours are set. */
  readonly name: string | null;
  readonly fromWallMs: number;
  readonly toWallMs: number;
}

/** A shift on one day. */
type Turn = ShiftWindow;

/**
 * The shift at an instant. Windows tile time without gap or overlap, so that everything counts once: where hours
 * overlap, the shift that began later has taken over; time outside all hours is a window of its own. Hours that no
 * clock shows are passed over.
 */
export function shiftWindow(
  shifts: readonly ShiftHours[],
  wallMs: number,
  offsetMinutesAt: OffsetMinutesAt,
): ShiftWindow {
  const turns = turnsAround(shifts, wallMs, offsetMinutesAt);
  const turn = turnAt(turns, wallMs);
  let fromWallMs = -Infinity;
  let toWallMs = Infinity;
  for (const border of turns.flatMap((one) => [one.fromWallMs, one.toWallMs])) {
    if (border <= wallMs && turnAt(turns, border - 1) !== turn) fromWallMs = Math.max(fromWallMs, border);
    if (border > wallMs && turnAt(turns, border) !== turn) toWallMs = Math.min(toWallMs, border);
  }
  return { name: turn?.name ?? null, fromWallMs, toWallMs };
}

function turnAt(turns: readonly Turn[], wallMs: number): Turn | null {
  let latest: Turn | null = null;
  for (const turn of turns) {
    if (turn.fromWallMs > wallMs || turn.toWallMs <= wallMs) continue;
    if (!latest || turn.fromWallMs > latest.fromWallMs) latest = turn;
  }
  return latest;
}

/** Two days to each side: enough for a shift across midnight and a gap that ends the next day, in any zone. */
function turnsAround(shifts: readonly ShiftHours[], wallMs: number, offsetMinutesAt: OffsetMinutesAt): Turn[] {
  const given = shifts.flatMap(({ name, from, to }) => {
    const fromMs = timeOfDayMs(from);
    const toMs = timeOfDayMs(to);
    return fromMs === null || toMs === null ? [] : [{ name, fromMs, toMs: toMs > fromMs ? toMs : toMs + dayMs }];
  });
  const hours = given.length > 0 ? given : [{ name: null, fromMs: 0, toMs: dayMs }];
  const today = Math.floor(localMsOf(wallMs, offsetMinutesAt) / dayMs) * dayMs;
  return [-2, -1, 0, 1, 2].flatMap((days) =>
    hours.map(({ name, fromMs, toMs }) => ({
      name,
      fromWallMs: instantOfLocal(today + days * dayMs + fromMs, offsetMinutesAt),
      toWallMs: instantOfLocal(today + days * dayMs + toMs, offsetMinutesAt),
    })),
  );
}

/** "24:00" is the end of a day. */
function timeOfDayMs(text: string): number | null {
  const [, hours, minutes] = /^(\d\d):(\d\d)$/.exec(text) ?? [];
  if (hours === undefined || minutes === undefined) return null;
  const ofDayMs = (Number(hours) * 60 + Number(minutes)) * 60_000;
  return Number(minutes) < 60 && ofDayMs <= dayMs ? ofDayMs : null;
}
