import { perKelvin, speedRatio } from './arrhenius.ts';
import type { DoseLaw } from './dose-law.ts';

/** A full cure as the maker gives it: this long at this temperature. */
export interface CurePair {
  readonly temperatureC: number;
  readonly minutes: number;
}

/** What an adhesive says of its cure. */
export interface CureLaw {
  /** At least one pair, in any order. */
  readonly curePairs: readonly CurePair[];
  /** Below this nothing counts. */
  readonly lowestC: number;
  /** Above this the adhesive or the parts may be harmed. */
  readonly highestC: number;
}

/** How a temperature stands to an adhesive's pairs and limits. */
export type CureRange = 'too cold' | 'within' | 'above top pair' | 'above highest';

const msPerMinute = 60_000;

/**
 * Minutes to a full cure at a constant temperature (°C): ln t linear in 1/T between pairs, exact at every pair.
 * Below `lowestC`: Infinity. Above the top pair: the top pair's minutes, since no maker vouches for less. Between
 * `lowestC` and the lowest pair: the slope of the lowest two pairs, carried on; with a single pair there is no slope,
 * so below that pair nothing counts.
 */
export function minutesToCure(law: CureLaw, temperatureC: number): number {
  return cureCurve(law)(temperatureC);
}

/** The same as a function of temperature alone, made once per adhesive. */
export function cureCurve(law: CureLaw): (temperatureC: number) => number {
  const pairs = ascending(law.curePairs);
  const bottom = pairs[0];
  const top = pairs.at(-1);
  return (temperatureC) => {
    if (!bottom || !top || !(temperatureC >= law.lowestC)) return Infinity;
    if (temperatureC >= top.temperatureC) return top.minutes;
    if (temperatureC < bottom.temperatureC && pairs.length === 1) return Infinity;
    const above = Math.max(
      1,
      pairs.findIndex((pair) => pair.temperatureC > temperatureC),
    );
    return between(pairs[above - 1] ?? bottom, pairs[above] ?? top, temperatureC);
  };
}

/** Between two pairs, or past either on the same line: ln t against 1/T. At the cooler pair the share is exactly 0. */
function between(cooler: CurePair, hotter: CurePair, temperatureC: number): number {
  const cold = perKelvin(cooler.temperatureC);
  const share = (cold - perKelvin(temperatureC)) / (cold - perKelvin(hotter.temperatureC));
  return cooler.minutes * Math.exp(share * Math.log(hotter.minutes / cooler.minutes));
}

/** Where a temperature (°C) stands: what the screen and the record must say beside the credit. */
export function cureRange(law: CureLaw, temperatureC: number): CureRange {
  if (temperatureC < law.lowestC) return 'too cold';
  if (temperatureC > law.highestC) return 'above highest';
  return temperatureC > topPairC(law) ? 'above top pair' : 'within';
}

/** The hottest temperature (°C) that a pair names. */
export function topPairC(law: CureLaw): number {
  return Math.max(...law.curePairs.map((pair) => pair.temperatureC));
}

/** The adhesive's cure as a law that a temperature course can be integrated under. */
export function cureDoseLaw(law: CureLaw): DoseLaw {
  const minutes = cureCurve(law);
  return {
    fullMs: (temperatureC) => minutes(temperatureC) * msPerMinute,
    breaksC: [law.lowestC, ...law.curePairs.map((pair) => pair.temperatureC)],
  };
}

/**
 * Pairs at other temperatures (°C) from one pair and an activation energy (kJ/mol), unrounded. "20 min at 100 °C,
 * 60 kJ/mol" gives 45.0 min at 85 °C and 7.48 min at 120 °C. Computed, not vouched for by a maker.
 */
export function pairsFrom(
  known: CurePair,
  activationKJPerMol: number,
  temperaturesC: readonly number[],
): readonly CurePair[] {
  return temperaturesC.map((temperatureC) => ({
    temperatureC,
    minutes: known.minutes / speedRatio(activationKJPerMol, temperatureC, known.temperatureC),
  }));
}

function ascending(pairs: readonly CurePair[]): readonly CurePair[] {
  return [...pairs].sort((a, b) => a.temperatureC - b.temperatureC);
}
