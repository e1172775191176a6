import type { Moment } from '../unit/moment.ts';
import { extremesC, segmentAt, segmentTemperatureC } from './course.ts';
import { cureDoseLaw, cureRange, topPairC, type CureLaw } from './cure-time.ts';
import { firstCountsMs, integrate, solve } from './dose.ts';
import { ovenCourse, type OvenCause } from './oven-course.ts';
import type { OvenEntry } from './oven-entry.ts';

export interface CureInput {
  /** When the load went in: the zero of every ms below. */
  readonly from: Moment;
  /** The recipe step's set point (°C): assumed where nothing was entered of the oven. */
  readonly setPointC: number;
  readonly adhesive: CureLaw & { readonly longestDose: number };
  /** What was entered of the oven, oldest first; empty where it is not known. */
  readonly oven: readonly OvenEntry[];
}

/** Why a cure stands as it does. Temperatures in °C. */
export type CureWhy =
  | Exclude<OvenCause, { kind: 'not set yet' }>
  | { readonly kind: 'too cold'; readonly temperatureC: number; readonly lowestC: number }
  | {
      readonly kind: 'above top pair';
      readonly temperatureC: number;
      readonly topPairC: number;
      /** Above the adhesive's highest temperature too. */
      readonly aboveHighest: boolean;
    };

/** One load's cure. Times in ms since the load went in, temperatures in °C, a dose of 1 is a full cure. */
export interface Cure {
  /** First whole ms with a dose of 1; null when, as things stand, it never comes. */
  readonly dueMs: number | null;
  /** First whole ms at which the recipe's longest dose is reached; null when it never is. */
  readonly overMs: number | null;
  /** Never below 1 from `dueMs` on. */
  doseAt(ms: number): number;
  temperatureAtC(ms: number): number;
  /** Coldest since the dose first counted, so that an interruption shows; null before that. */
  coldestSinceCountingC(ms: number): number | null;
  hottestC(ms: number): number;
  whyAt(ms: number): CureWhy;
  /** Why, as of the latest entry about the oven (or the start, where that is later). */
  readonly why: CureWhy;
  /** Whether an entry of another tablet's log was placed by wall clocks. */
  readonly acrossClocks: boolean;
}

/** The cure of a load from when it went in and what was entered about its oven. */
export function cureOf({ from, setPointC, adhesive, oven }: CureInput): Cure {
  const { segments: course, latestMs, acrossClocks } = ovenCourse(oven, from, setPointC);
  const law = cureDoseLaw(adhesive);
  const dueMs = wholeMs(solve(course, law, 0, 1));
  const countsMs = firstCountsMs(course, law, 0);
  const temperatureAtC = (ms: number): number => {
    const segment = segmentAt(course, ms);
    return segment ? segmentTemperatureC(segment, ms) : setPointC;
  };
  const whyAt = (ms: number): CureWhy => {
    const cause = segmentAt(course, ms)?.cause ?? { kind: 'assumed set point', temperatureC: setPointC };
    return judged(cause, temperatureAtC(ms), adhesive);
  };
  return {
    dueMs,
    overMs: wholeMs(solve(course, law, 0, adhesive.longestDose)),
    doseAt(ms) {
      const dose = integrate(course, law, 0, ms);
      return dueMs !== null && ms >= dueMs ? Math.max(1, dose) : dose;
    },
    temperatureAtC,
    coldestSinceCountingC: (ms) =>
      countsMs === null || ms < countsMs ? null : (extremesC(course, countsMs, ms)?.coldestC ?? null),
    hottestC: (ms) => extremesC(course, 0, ms)?.hottestC ?? setPointC,
    whyAt,
    why: whyAt(Math.max(0, latestMs)),
    acrossClocks,
  };
}

/** Rounded up, so that a cure never ends sooner; a thousandth of a ms is the solver's own noise. */
function wholeMs(ms: number | null): number | null {
  return ms === null ? null : Math.ceil(ms - 1e-3);
}

function judged(cause: OvenCause, temperatureC: number, adhesive: CureLaw): CureWhy {
  if (cause.kind === 'warming up' || cause.kind === 'door opened' || cause.kind === 'power cut') return cause;
  const range = cureRange(adhesive, temperatureC);
  if (range === 'too cold' || cause.kind === 'not set yet') {
    return { kind: 'too cold', temperatureC, lowestC: adhesive.lowestC };
  }
  if (range === 'within') return cause;
  return {
    kind: 'above top pair',
    temperatureC,
    topPairC: topPairC(adhesive),
    aboveHighest: range === 'above highest',
  };
}
