import type { Refusal } from './refusal.ts';

export interface Range {
  readonly lowest: number;
  readonly highest: number;
}

/** Where people work; outside it a typed room temperature is a slip. Common practice, no source. */
export const roomRangeC: Range = { lowest: 5, highest: 45 };
/** What a curing oven or heat block of this trade can show. Common practice, no source. */
export const ovenRangeC: Range = { lowest: 0, highest: 250 };
/** The longest time constant of an oven's warm-up that is believed, in seconds. */
export const mostWarmUpS = 4 * 3600;

export function checkTemperature(temperatureC: number, range: Range): Refusal | null {
  const within = temperatureC >= range.lowest && temperatureC <= range.highest;
  return within ? null : { code: 'temperature out of range', found: temperatureC, ...range };
}
