/** Minutes that local time is ahead of UTC at an instant (ms since 1970), from the zone's rules. */
export type OffsetMinutesAt = (wallMs: number) => number;

const minuteMs = 60_000;
export const dayMs = 24 * 60 * minuteMs;

/** Local time as if it were UTC, in ms. */
export function localMsOf(wallMs: number, offsetMinutesAt: OffsetMinutesAt): number {
  return wallMs + offsetMinutesAt(wallMs) * minuteMs;
}

/**
 * The first instant at which the local clock shows `localMs` or later. Of an hour that comes twice it is the first
 * one; of an hour that is left out, the jump itself.
 */
export function instantOfLocal(localMs: number, offsetMinutesAt: OffsetMinutesAt): number {
  const before = offsetMinutesAt(localMs - dayMs);
  const after = offsetMinutesAt(localMs + dayMs);
  let early = localMs - Math.max(before, after) * minuteMs;
  let late = localMs - Math.min(before, after) * minuteMs;
  const shown = (wallMs: number) => localMsOf(wallMs, offsetMinutesAt) >= localMs;
  if (shown(early)) return early;
  while (late - early > 1) {
    const middle = Math.floor((early + late) / 2);
    if (shown(middle)) late = middle;
    else early = middle;
  }
  return late;
}
