import type { BenchWide } from '../core/batch/types.ts';
import { defectText } from '../core/recipe/read.ts';
import type { Recipe } from '../core/recipe/schema.ts';
import type { OffsetMinutesAt } from '../core/review/local-time.ts';
import { ratioOf, type Ratio } from '../core/review/ratio.ts';
import type { DefectTotal, ShiftSummary } from '../core/review/shift.ts';
import type { ShiftWindow } from '../core/review/shift-window.ts';
import type { CycleSpread, Spread } from '../core/review/tally.ts';
import { dateOf, span, timeOfDay } from '../words/format.ts';
import type { Words } from '../words/index.ts';

export interface ShiftContext {
  readonly wide: Pick<BenchWide, 'recipes' | 'ovens' | 'mixes'>;
  readonly words: Words;
  readonly offsetMinutesAt: OffsetMinutesAt;
}

const percent = (share: number): number => Math.round(share * 100);

/** A day that loses an hour in spring is whole all the same. */
const shortestDayMs = 23 * 3_600_000;

/** What a window is called: its shift, or what it is where it has none. */
export function windowName({ name, fromWallMs, toWallMs }: ShiftWindow, words: Words): string {
  return name ?? (toWallMs - fromWallMs < shortestDayMs ? words.shift.between : words.shift.day);
}

export function windowHours({ fromWallMs, toWallMs }: ShiftWindow, context: ShiftContext): string {
  const { words, offsetMinutesAt } = context;
  const offset = offsetMinutesAt(fromWallMs);
  return words.shift.hours(
    dateOf(fromWallMs, offset),
    timeOfDay(fromWallMs, offset),
    endOfDay(timeOfDay(toWallMs, offsetMinutesAt(toWallMs))),
  );
}

/** What ends at midnight ends that day, and does not begin it. */
const endOfDay = (time: string): string => (time === '00:00' ? '24:00' : time);

/** The shift in one sentence. */
export function shiftSentence(summary: ShiftSummary, context: ShiftContext): string {
  const say = context.words.shift.sentence;
  const { firstPass, scrapped, inWork, sendBacks } = summary;
  if (!firstPass) return say.nothing(inWork);
  const [most] = sendBacks;
  const parts = [
    say.firstPass(
      firstPass.count,
      firstPass.of,
      percent(firstPass.share),
      percent(firstPass.low),
      percent(firstPass.high),
    ),
    say.scrapped(scrapped),
    most ? say.mostSentBack(lowerFirst(causeText(most.defect, context)), most.connectors) : say.noneSentBack,
  ];
  return `${parts.join('; ')}.`;
}

export interface Figure {
  readonly id: 'passed' | 'firstPass' | 'scrapped' | 'inWork';
  readonly name: string;
  readonly value: string;
  /** Stands after the value, smaller. */
  readonly unit: string;
  /** Numerator and denominator, and the interval where there is one. */
  readonly beneath: readonly string[];
  readonly formula: string;
}

/** The four numbers, each with what it is out of. */
export function shiftFigures(summary: ShiftSummary, { words }: ShiftContext): Figure[] {
  const say = words.shift;
  const { passed, scrapped, finished, carriedIn, started, inWork, firstPass } = summary;
  const figure = (id: Figure['id'], value: string, beneath: string[], unit = ''): Figure => ({
    id,
    name: say.figure[id],
    value,
    unit,
    beneath,
    formula: say.formulas[id],
  });
  const scrapRatio = ratioOf(scrapped, finished);
  return [
    figure('passed', String(passed), [say.of(passed, carriedIn + started, say.ofHandled)]),
    firstPass
      ? figure('firstPass', String(percent(firstPass.share)), ratioWords(firstPass, words), '%')
      : figure('firstPass', say.none, ratioWords(firstPass, words)),
    figure('scrapped', String(scrapped), ratioWords(scrapRatio, words)),
    figure('inWork', String(inWork), [
      say.of(inWork, carriedIn + started, say.ofHandled),
      say.carried(carriedIn, started),
    ]),
  ];
}

function ratioWords(ratio: Ratio | null, words: Words): string[] {
  const say = words.shift;
  if (!ratio) return [say.of(0, 0, say.ofFinished)];
  return [say.of(ratio.count, ratio.of, say.ofFinished), say.interval(percent(ratio.low), percent(ratio.high))];
}

export interface RecipeRow {
  readonly key: string;
  readonly name: string;
  /** Passed, right first time, scrapped, in work, median cycle: each under its heading. */
  readonly cells: readonly { readonly heading: string; readonly text: string }[];
}

export function recipeRows(summary: ShiftSummary, { wide, words }: ShiftContext): RecipeRow[] {
  const say = words.shift;
  return summary.byRecipe.map(({ recipe, passed, scrapped, inWork, firstPass, cycle }) => {
    const name = wide.recipes[recipe.hash]?.recipe.texts.en.name ?? recipe.id;
    const share = firstPass ? `${firstPass.count}/${firstPass.of}, ${percent(firstPass.share)} %` : say.none;
    return {
      key: recipe.hash,
      name: say.byRecipe.revision(name, recipe.revision),
      cells: [
        { heading: say.figure.passed, text: String(passed) },
        { heading: say.figure.firstPass, text: share },
        { heading: say.figure.scrapped, text: String(scrapped) },
        { heading: say.figure.inWork, text: String(inWork) },
        { heading: say.byRecipe.cycle, text: cycle.passed ? span(cycle.passed.total.medianMs) : say.none },
      ],
    };
  });
}

export interface CycleView {
  readonly sentence: string;
  readonly bar: string;
  readonly parts: readonly {
    readonly name: string;
    readonly value: number;
    readonly text: string;
    readonly paint: 'full' | 'hatched' | 'hollow';
  }[];
  readonly rows: readonly { readonly name: string; readonly median: string; readonly ninetieth: string }[];
  readonly acrossClocks: number;
}

/** Null where nothing passed. */
export function cycleView(spread: CycleSpread | null, words: Words): CycleView | null {
  if (!spread) return null;
  const say = words.shift.cycle;
  const { connectors, total, handsOn, cure, waiting, acrossClocks } = spread;
  const part = (name: string, { sumMs }: Spread, paint: 'full' | 'hatched' | 'hollow') => {
    const value = sumMs / connectors;
    return { name, value, text: span(value), paint };
  };
  const row = (name: string, { medianMs, ninetiethPercentileMs }: Spread) => ({
    name,
    median: span(medianMs),
    ninetieth: span(ninetiethPercentileMs),
  });
  return {
    sentence: say.sentence(connectors, span(total.medianMs), span(total.ninetiethPercentileMs)),
    bar: say.bar(connectors),
    parts: [part(say.handsOn, handsOn, 'full'), part(say.cure, cure, 'hatched'), part(say.waiting, waiting, 'hollow')],
    rows: [row(say.total, total), row(say.handsOn, handsOn), row(say.cure, cure), row(say.waiting, waiting)],
    acrossClocks,
  };
}

export interface Cause {
  readonly name: string;
  readonly count: number;
}

export function causes(totals: readonly DefectTotal[], context: ShiftContext): Cause[] {
  return totals.map(({ defect, connectors }) => ({ name: causeText(defect, context), count: connectors }));
}

/** Causes are summed by code over all recipes; the first that knows the code names it. */
function causeText(code: string, { wide }: ShiftContext): string {
  const knowing = Object.values(wide.recipes).find(({ recipe }) => knowsDefect(recipe, code));
  return knowing ? defectText(knowing.recipe, code, 'en') : code;
}

const knowsDefect = (recipe: Recipe, code: string): boolean => recipe.defects.some((defect) => defect.code === code);

export const lowerFirst = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);
