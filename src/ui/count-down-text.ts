/**
 * A count-down as read from a distance: m:ss, from one hour h:mm:ss, with + once it is past due. Before due it rounds
 * up, so that 0:00 means due; after, it rounds down.
 */
export function countDownText(remainingMs: number): string {
  const past = remainingMs < 0;
  const seconds = past ? Math.floor(-remainingMs / 1000) : Math.ceil(remainingMs / 1000);
  const two = (value: number): string => String(value).padStart(2, '0');
  const hours = Math.floor(seconds / 3600);
  const minutes = Math.floor((seconds % 3600) / 60);
  const clock = hours > 0 ? `${hours}:${two(minutes)}:${two(seconds % 60)}` : `${minutes}:${two(seconds % 60)}`;
  return past ? `+${clock}` : clock;
}

/** Same span for a reader of the screen, as an ISO 8601 duration. */
export function countDownDuration(remainingMs: number): string {
  return `PT${Math.ceil(Math.abs(remainingMs) / 1000)}S`;
}
