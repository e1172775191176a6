export interface ZoneWindow {
  readonly Date: new (ms: number) => { getTimezoneOffset(): number };
}

/** Minutes that local time is ahead of UTC at an instant (ms since 1970), by the rules of the tablet's zone. */
export function zoneOffset(window: ZoneWindow = globalThis): (wallMs: number) => number {
  // Zero minutes west must not become minus zero.
  return (wallMs) => 0 - new window.Date(wallMs).getTimezoneOffset();
}
