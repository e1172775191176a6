import type { CureWhy } from '../core/cure/cure.ts';
import type { Clock } from '../core/timer/clock.ts';
import type { Reading } from '../core/timer/reading.ts';
import { compareMoments, elapsedMs, type Moment } from '../core/unit/moment.ts';
import { decimals, timeOfDay } from '../words/format.ts';
import type { Words } from '../words/index.ts';

/** Wall time of day of a moment of the bench, as this tablet's people read it. */
export type ShowTime = (moment: Moment) => string;

/** A moment in the past or to come is shown by how far it lies from now, so that a clock set since is of no account. */
export function showTimeAt(now: Moment, offsetMinutes: number): ShowTime {
  return (moment) => {
    const away = compareMoments(moment, now) <= 0 ? -elapsedMs(moment, now) : elapsedMs(now, moment);
    return timeOfDay(now.wall + away, offsetMinutes);
  };
}

const celsius = (temperatureC: number): string => decimals(temperatureC, 1);

/** Why a cure runs as it does: "oven read 92 °C at 10:14". */
export function whyWords(why: CureWhy, words: Words, time: ShowTime): string {
  const say = words.bench.why;
  switch (why.kind) {
    case 'set point':
    case 'assumed set point':
      return say[why.kind](celsius(why.temperatureC));
    case 'warming up':
      return say['warming up'](celsius(why.towardC));
    case 'oven read':
      return say['oven read'](celsius(why.temperatureC), time(why.at));
    case 'door opened':
    case 'power cut':
      return say[why.kind](time(why.at));
    case 'too cold':
      return say['too cold'](celsius(why.temperatureC), celsius(why.lowestC));
    case 'above top pair':
      return why.aboveHighest
        ? say['above highest'](celsius(why.temperatureC))
        : say['above top pair'](celsius(why.temperatureC), celsius(why.topPairC));
  }
}

/** What stands beneath a count-down. Dose as a share, 1 for a full cure; null for what is no cure. */
export function countWords(reading: Reading, dose: number | null, words: Words, time: ShowTime) {
  const { clock, state } = reading;
  const say = words.bench.count;
  if (reading.leftMs === Infinity) return say.never;
  if (state === 'over' && clock.over) return say.overSince(time(clock.over));
  if (clock.kind === 'aim')
    return state === 'done' && clock.due && reading.leftMs <= 0 ? say.filmTaken(time(clock.due)) : say.onFilm;
  if (state === 'done' && clock.due) return say.doneAt(time(clock.due));
  if (clock.kind === 'at most') return say.workingLife;
  return dose === null ? say.toGo : say.toGoDose(percent(dose));
}

/** Rounded down: 100 % is never said before it is there. */
export const percent = (dose: number): number => Math.floor(dose * 100 + 1e-9);

export function countState(reading: Reading): 'running' | 'waiting' | 'over' {
  if (reading.state === 'over') return 'over';
  return reading.state === 'done' ? 'waiting' : 'running';
}

/** In the rail: what the clock is of, in two words. */
export function railWords(clock: Clock, label: string, dose: number | null, words: Words): string {
  if (clock.about.type === 'working life') return words.bench.count.workingLife;
  return dose === null ? label : `${label}, ${percent(dose)} %`;
}
