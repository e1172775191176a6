import { shiftOf } from '../core/review/shift.ts';
import type { SummaryRow } from '../core/review/summary-row.ts';
import type { BenchState } from './bench-state.svelte.ts';
import { shiftChoices } from './shift-windows.ts';
import { offsetMinutesAt } from './shift-zone.ts';

/** The numbers of this shift or of one before it. Rows of closed batches are read once, from the earliest choice on. */
export class ShiftReport {
  readonly #bench: BenchState;
  /** 0 is the shift that runs. */
  back = $state(0);
  #rows = $state.raw<readonly SummaryRow[] | null>(null);
  unread = $state(false);

  readonly #minute = $derived.by(() => Math.floor(this.#bench.now.wall / 60_000));
  readonly choices = $derived.by(() =>
    shiftChoices(this.#bench.bench.wide.shifts, this.#minute * 60_000, offsetMinutesAt),
  );
  readonly window = $derived(this.choices[this.back]);

  /** Null until the rows are read. */
  readonly summary = $derived.by(() => {
    if (!this.#rows || !this.window) return null;
    const { fromWallMs, toWallMs } = this.window;
    return shiftOf(this.#rows, Object.values(this.#bench.bench.batches), fromWallMs, toWallMs);
  });

  /** Which recipe and work order a batch in the report has. */
  readonly batches = $derived.by(() => {
    const known = new Map<string, { readonly hash: string; readonly workOrder: string }>();
    for (const row of this.#rows ?? []) known.set(row.batch, { hash: row.recipe.hash, workOrder: row.workOrder });
    for (const { id, recipeHash, workOrder } of Object.values(this.#bench.bench.batches)) {
      known.set(id, { hash: recipeHash, workOrder });
    }
    return known;
  });

  constructor(bench: BenchState) {
    this.#bench = bench;
    const earliest = this.choices.at(-1);
    bench.log.summaryRows(earliest?.fromWallMs ?? 0).then(
      (rows) => (this.#rows = rows),
      () => (this.unread = true),
    );
  }
}
