import { shifted, type Moment } from '../unit/moment.ts';
import { segmentTemperatureC, type Segment } from './course.ts';
import { bearingEntries, forgottenAfterMs, type OvenEntry, type PlacedEntry } from './oven-entry.ts';

/** Room temperature (°C) that an oven is at or falls to when nothing better is known. Common practice, no source. */
export const ambientC = 23;
/** A lag counts as arrived when this near (°C) to where it goes. Common practice, no source. */
export const arrivedWithinC = 0.5;
/**
 * An oven that nobody wrote of for so long (ms) before it is set is taken as cold: the usual case is a shop that
 * switches it off at night without an entry. Common practice, no source.
 */
export const vouchedForMs = 4 * 3_600_000;

/** What the temperature of a segment rests on. Temperatures in °C. */
export type OvenCause =
  | { readonly kind: 'assumed set point'; readonly temperatureC: number }
  | { readonly kind: 'not set yet' }
  | { readonly kind: 'set point'; readonly temperatureC: number }
  | { readonly kind: 'warming up'; readonly towardC: number; readonly until: Moment }
  | { readonly kind: 'oven read'; readonly temperatureC: number; readonly at: Moment }
  | { readonly kind: 'door opened'; readonly at: Moment }
  | { readonly kind: 'power cut'; readonly at: Moment };

export interface OvenSegment extends Segment {
  readonly cause: OvenCause;
}

/** Times in ms since the load went in. */
export interface OvenCourse {
  /** From -Infinity to Infinity without gaps. */
  readonly segments: readonly OvenSegment[];
  /** When the latest entry happened; -Infinity where there is none. */
  readonly latestMs: number;
  /** Whether an entry of the last day was written by another log, so that only wall clocks place it. */
  readonly acrossClocks: boolean;
}

interface OvenState {
  readonly setPointC: number;
  /** Whether the set point was entered or is only the recipe's. */
  readonly entered: boolean;
  /** Time constant in ms; null where the shop has measured none. */
  readonly lagMs: number | null;
  readonly cutAt: Moment | null;
}

/** Where a stretch begins and ends, in ms, and what stood before it. */
interface Stretch {
  readonly zero: Moment;
  readonly fromMs: number;
  readonly toMs: number;
  readonly beforeC: number;
}

/**
 * The temperature of an oven in ms since `zero` (when the load went in), from all that was entered about it. The load
 * is taken to be as warm as the oven. Careful wherever something is unknown:
 * - Nothing entered: the recipe's set point, as an assumption; so too before the first entry, except that an oven
 *   whose first entry is a setting was cold until then.
 * - Set: a lag from the temperature before toward the set point; without a time constant, the set point at once. An
 *   oven without entries for `vouchedForMs` starts from ambient.
 * - Read: that temperature from then on. Between two readings with nothing else between them: a straight line. After
 *   the last: a lag toward the set point; without a time constant the reading is held, but never above the set point.
 * - Door opened: down to ambient and back by the lag; without a time constant nothing counts until a reading or a
 *   setting.
 * - Power cut: down to ambient (by the lag, or at once) until it is set anew; a reading meanwhile does not keep.
 */
export function ovenCourse(history: readonly OvenEntry[], zero: Moment, recipeSetPointC: number): OvenCourse {
  const entries = bearingEntries(history, zero);
  let oven: OvenState = { setPointC: recipeSetPointC, entered: false, lagMs: null, cutAt: null };
  const segments: OvenSegment[] = [beforeAll(entries[0], oven)];
  entries.forEach((placed, index) => {
    const next = entries[index + 1];
    const previousMs = entries[index - 1]?.ms ?? -Infinity;
    const trusted = placed.entry.kind !== 'set' || placed.ms - previousMs <= vouchedForMs;
    const beforeC = trusted ? justBeforeC(segments) : ambientC;
    const stretch: Stretch = { zero, fromMs: placed.ms, toMs: next?.ms ?? Infinity, beforeC };
    oven = changed(oven, placed.entry);
    segments.push(...follow(oven, placed.entry, next, stretch).filter((segment) => segment.fromMs < segment.toMs));
  });
  return {
    segments,
    latestMs: entries.at(-1)?.ms ?? -Infinity,
    acrossClocks: entries.some(({ ms, entry }) => entry.at.log !== zero.log && ms > -forgottenAfterMs),
  };
}

function beforeAll(first: PlacedEntry | undefined, { setPointC }: OvenState): OvenSegment {
  const bounds = { fromMs: -Infinity, toMs: first?.ms ?? Infinity };
  return first?.entry.kind === 'set'
    ? { ...bounds, ...steady(ambientC), cause: { kind: 'not set yet' } }
    : { ...bounds, ...steady(setPointC), cause: { kind: 'assumed set point', temperatureC: setPointC } };
}

function changed(oven: OvenState, entry: OvenEntry): OvenState {
  if (entry.kind === 'power cut') return { ...oven, cutAt: entry.at };
  if (entry.kind !== 'set') return oven;
  const lagMs = entry.warmUpS ? entry.warmUpS * 1000 : null;
  return { setPointC: entry.setPointC, entered: true, lagMs, cutAt: null };
}

function follow(oven: OvenState, entry: OvenEntry, next: PlacedEntry | undefined, stretch: Stretch): OvenSegment[] {
  switch (entry.kind) {
    case 'set': {
      if (oven.lagMs === null) return [held(stretch, oven.setPointC, settled(oven))];
      const [lag, rest] = toward(stretch, stretch.beforeC, oven.setPointC, oven.lagMs);
      const until = shifted(stretch.zero, lag.toMs);
      const warming: OvenCause = { kind: 'warming up', towardC: oven.setPointC, until };
      const cause = stretch.beforeC < oven.setPointC ? warming : settled(oven);
      return [
        { ...lag, cause },
        { ...rest, cause: settled(oven) },
      ];
    }
    case 'read':
      return afterReading(oven, entry, next, stretch);
    case 'door opened':
      return adrift(oven, stretch, ambientC, ambientC, { kind: 'door opened', at: entry.at });
    case 'power cut':
      return adrift(oven, stretch, stretch.beforeC, ambientC, settled(oven));
  }
}

function afterReading(
  oven: OvenState,
  { temperatureC, at }: Extract<OvenEntry, { kind: 'read' }>,
  next: PlacedEntry | undefined,
  stretch: Stretch,
): OvenSegment[] {
  const cause: OvenCause = { kind: 'oven read', temperatureC, at };
  if (next?.entry.kind === 'read') {
    const shape = { kind: 'linear', startC: temperatureC, endC: next.entry.temperatureC } as const;
    return [{ fromMs: stretch.fromMs, toMs: stretch.toMs, shape, cause }];
  }
  return adrift(oven, stretch, temperatureC, Math.min(temperatureC, oven.setPointC), cause);
}

/** By the lag from `startC` to where the oven goes; without a time constant, at `withoutLagC` or, cut off, ambient. */
function adrift(
  oven: OvenState,
  stretch: Stretch,
  startC: number,
  withoutLagC: number,
  cause: OvenCause,
): OvenSegment[] {
  if (oven.lagMs === null) {
    return oven.cutAt ? [held(stretch, ambientC, settled(oven))] : [held(stretch, withoutLagC, cause)];
  }
  const [lag, rest] = toward(stretch, startC, oven.cutAt ? ambientC : oven.setPointC, oven.lagMs);
  return [
    { ...lag, cause },
    { ...rest, cause: settled(oven) },
  ];
}

/** What an oven left to itself rests on. */
function settled({ cutAt, entered, setPointC }: OvenState): OvenCause {
  if (cutAt) return { kind: 'power cut', at: cutAt };
  return { kind: entered ? 'set point' : 'assumed set point', temperatureC: setPointC };
}

function held({ fromMs, toMs }: Stretch, temperatureC: number, cause: OvenCause): OvenSegment {
  return { fromMs, toMs, ...steady(temperatureC), cause };
}

/** A lag until it has arrived, and the temperature that it arrived at. */
function toward({ fromMs, toMs }: Stretch, startC: number, towardC: number, constantMs: number): [Segment, Segment] {
  const farC = Math.abs(startC - towardC);
  const arrivedMs = fromMs + (farC > arrivedWithinC ? constantMs * Math.log(farC / arrivedWithinC) : 0);
  const turnMs = Math.min(toMs, arrivedMs);
  return [
    { fromMs, toMs: turnMs, shape: { kind: 'lag', startC, towardC, constantMs } },
    { fromMs: turnMs, toMs, ...steady(towardC) },
  ];
}

function steady(temperatureC: number) {
  return { shape: { kind: 'constant', temperatureC } } as const;
}

function justBeforeC(segments: readonly OvenSegment[]): number {
  const last = segments.at(-1);
  return last ? segmentTemperatureC(last, last.toMs) : ambientC;
}
