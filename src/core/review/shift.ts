import type { Batch } from '../batch/types.ts';
import { accountOf, unfinishedIn, type BatchAccount, type DefectCount, type RecipeKey } from './batch-account.ts';
import type { Lateness } from './lateness.ts';
import type { SummaryRow } from './summary-row.ts';
import { addTimes, newTally, totalsOf, type Tally, type Totals } from './tally.ts';

export interface DefectTotal {
  readonly defect: string;
  readonly connectors: number;
}

/** One shift, or any other window of wall time, `fromWallMs` within and `toWallMs` beyond it. */
export interface ShiftSummary extends Totals {
  readonly fromWallMs: number;
  readonly toWallMs: number;
  readonly byRecipe: readonly (Totals & { readonly recipe: RecipeKey })[];
  /** Connectors sent back, by cause, the most frequent first; one that went back twice counts twice. */
  readonly sendBacks: readonly DefectTotal[];
  readonly scraps: readonly DefectTotal[];
  /** Clocks that ended in the window, in the order of their end. */
  readonly lateness: readonly Lateness[];
}

/**
 * Sums a window. A connector counts where it finished, whenever its batch closes: `rows` are all rows from
 * `summaryKeysFrom(fromWallMs)` on, later ones too, one a batch. A batch given as open is read from its state
 * and not from a row that an earlier closing left behind.
 */
export function shiftOf(
  rows: readonly SummaryRow[],
  openBatches: readonly Batch[],
  fromWallMs: number,
  toWallMs: number,
): ShiftSummary {
  const count = new WindowCount(fromWallMs, toWallMs);
  const open = new Set(openBatches.map(({ id }) => id));
  for (const batch of openBatches) count.add(accountOf(batch), unfinishedIn(batch));
  for (const row of rows) if (!open.has(row.batch)) count.add(row, 0);
  return count.summary();
}

/** A growing count: one pass over the connectors, in plain loops, since a year has hundreds of thousands. */
class WindowCount {
  readonly #fromWallMs: number;
  readonly #toWallMs: number;
  readonly #recipes = new Map<string, { recipe: RecipeKey; tally: Tally }>();
  readonly #sendBacks = new Map<string, number>();
  readonly #scraps = new Map<string, number>();
  readonly #lateness: Lateness[] = [];

  constructor(fromWallMs: number, toWallMs: number) {
    this.#fromWallMs = fromWallMs;
    this.#toWallMs = toWallMs;
  }

  add(account: BatchAccount, unfinished: number): void {
    const tally = this.#tallyOf(account.recipe);
    // A wall clock set back since must not make anything happen before its batch was opened.
    const whenMs = (wallMs: number) => Math.max(wallMs, account.openedWallMs);
    const openedBefore = account.openedWallMs < this.#fromWallMs;
    const openedLater = account.openedWallMs >= this.#toWallMs;
    let finishedBefore = 0;
    let finishedLater = 0;
    for (const connector of account.connectors) {
      const finishedWallMs = whenMs(connector.finishedWallMs);
      if (finishedWallMs < this.#fromWallMs) finishedBefore += 1;
      else if (finishedWallMs >= this.#toWallMs) finishedLater += 1;
      else {
        addTimes(connector.outcome === 'passed' ? tally.passed : tally.scrapped, connector);
        if (connector.firstPass) tally.firstPass += 1;
      }
    }
    if (!openedLater) {
      const alive = account.connectors.length + unfinished - finishedBefore;
      if (openedBefore) tally.carriedIn += alive;
      else tally.started += alive;
      tally.inWork += finishedLater + unfinished;
    }
    for (const defect of account.defects) if (this.#holds(whenMs(defect.wallMs))) this.#addDefect(defect);
    for (const late of account.lateness) if (this.#holds(whenMs(late.wallMs))) this.#lateness.push(late);
  }

  summary(): ShiftSummary {
    const recipes = [...this.#recipes.values()].sort((a, b) => compareRecipes(a.recipe, b.recipe));
    const byRecipe = recipes.map(({ recipe, tally }) => ({ recipe, ...totalsOf([tally]) }));
    return {
      fromWallMs: this.#fromWallMs,
      toWallMs: this.#toWallMs,
      ...totalsOf(recipes.map(({ tally }) => tally)),
      byRecipe: byRecipe.filter(({ carriedIn, started }) => carriedIn + started > 0),
      sendBacks: mostFrequentFirst(this.#sendBacks),
      scraps: mostFrequentFirst(this.#scraps),
      lateness: this.#lateness.sort((a, b) => a.wallMs - b.wallMs || compareTexts(a.batch, b.batch)),
    };
  }

  #tallyOf(recipe: RecipeKey): Tally {
    const found = this.#recipes.get(recipe.hash);
    if (found) return found.tally;
    const tally = newTally();
    this.#recipes.set(recipe.hash, { recipe, tally });
    return tally;
  }

  #addDefect({ kind, defect, connectors }: DefectCount): void {
    const totals = kind === 'sent back' ? this.#sendBacks : this.#scraps;
    totals.set(defect, (totals.get(defect) ?? 0) + connectors);
  }

  #holds(wallMs: number): boolean {
    return wallMs >= this.#fromWallMs && wallMs < this.#toWallMs;
  }
}

function mostFrequentFirst(totals: ReadonlyMap<string, number>): DefectTotal[] {
  return [...totals]
    .map(([defect, connectors]) => ({ defect, connectors }))
    .sort((a, b) => b.connectors - a.connectors || compareTexts(a.defect, b.defect));
}

function compareRecipes(a: RecipeKey, b: RecipeKey): number {
  return compareTexts(a.id, b.id) || compareTexts(a.revision, b.revision) || compareTexts(a.hash, b.hash);
}

const compareTexts = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);
