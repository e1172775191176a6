import { compareMoments, elapsedMs, type Moment } from '../core/unit/moment.ts';
import { dateOf } from '../words/format.ts';
import { showTimeAt, type ShowTime } from './clock-words.ts';

/** From here on a time of day alone could be taken for another day's, in ms. */
const sameDayMs = 12 * 3_600_000;

/** As `showTimeAt`, with the date where a moment lies half a day or more back. */
export function showDayAt(now: Moment, offsetMinutes: number): ShowTime {
  const time = showTimeAt(now, offsetMinutes);
  return (moment) => {
    const agoMs = compareMoments(moment, now) <= 0 ? elapsedMs(moment, now) : 0;
    return agoMs < sameDayMs ? time(moment) : `${time(moment)}, ${dateOf(now.wall - agoMs, offsetMinutes)}`;
  };
}
