/** Numbers and times as they stand in sentences; the same in every language that writes left to right in digits. */

const pad = (value: number): string => String(value).padStart(2, '0');

/** Wall time of day "HH:MM" at a zone offset in minutes east of UTC. */
export function timeOfDay(wallMs: number, offsetMinutes: number): string {
  const minutes = Math.floor(wallMs / 60_000) + offsetMinutes;
  const ofDay = ((minutes % 1440) + 1440) % 1440;
  return `${pad(Math.floor(ofDay / 60))}:${pad(ofDay % 60)}`;
}

/** Date "YYYY-MM-DD" at a zone offset in minutes east of UTC. */
export function dateOf(wallMs: number, offsetMinutes: number): string {
  return new Date(wallMs + offsetMinutes * 60_000).toISOString().slice(0, 10);
}

/** A span as a person says it: "45 s", "12 min", "1 h 05 min". Rounded down, so that nothing is promised too long. */
export function span(ms: number): string {
  const seconds = Math.floor(Math.abs(ms) / 1000);
  if (seconds < 90) return `${seconds} s`;
  const minutes = Math.floor(seconds / 60);
  return minutes < 90 ? `${minutes} min` : `${Math.floor(minutes / 60)} h ${pad(minutes % 60)} min`;
}

/** Connector numbers short: "1 to 4, 7". */
export function numberList(numbers: readonly number[]): string {
  const sorted = [...numbers].sort((a, b) => a - b);
  const runs: [number, number][] = [];
  for (const number of sorted) {
    const last = runs.at(-1);
    if (last && number === last[1] + 1) last[1] = number;
    else runs.push([number, number]);
  }
  return runs
    .map(([from, to]) => (from === to ? `${from}` : to === from + 1 ? `${from}, ${to}` : `${from} to ${to}`))
    .join(', ');
}

/** A number with at most so many decimals, without trailing zeros. */
export function decimals(value: number, most: number): string {
  return String(Number(value.toFixed(most)));
}
