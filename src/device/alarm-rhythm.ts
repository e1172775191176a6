/** Soon: hands are needed shortly. Due: now. Over: a limit was passed. */
export type Urgency = 'soon' | 'due' | 'over';

export interface Pulse {
  readonly startMs: number;
  readonly lengthMs: number;
}

/** One phrase, begun again every `periodMs` while the alarm holds. */
export interface Rhythm {
  readonly pulses: readonly Pulse[];
  readonly periodMs: number;
}

const rhythm = (lengthsMs: readonly number[], gapMs: number, periodMs: number): Rhythm => {
  let startMs = 0;
  const pulses = lengthsMs.map((lengthMs) => {
    const pulse = { startMs, lengthMs };
    startMs += lengthMs + gapMs;
    return pulse;
  });
  return { pulses, periodMs };
};

/**
 * The three urgencies differ in how many pulses, how long and how often, never in pitch: hearing loss and a noisy shop
 * spoil pitch first. Rhythms of our own; this is no medical device and follows no alarm standard.
 */
export const rhythms: Readonly<Record<Urgency, Rhythm>> = {
  soon: rhythm([450], 0, 8_000),
  due: rhythm([400, 150, 150], 150, 3_500),
  over: rhythm([120, 120, 120, 120, 120, 120], 110, 2_000),
};

/** Loudness, 0 to 1, of an alarm that has been asking for `heldForMs`: louder after 30 s and again after 2 min. */
export function loudness(heldForMs: number): number {
  if (heldForMs < 30_000) return 0.35;
  return heldForMs < 120_000 ? 0.65 : 1;
}

/** The phrase as the vibration motor takes it: on, off, on, ... in ms. */
export function vibrationPattern(urgency: Urgency): number[] {
  const { pulses } = rhythms[urgency];
  return pulses.flatMap((pulse, index) => {
    const next = pulses[index + 1];
    return next === undefined ? [pulse.lengthMs] : [pulse.lengthMs, next.startMs - pulse.startMs - pulse.lengthMs];
  });
}
