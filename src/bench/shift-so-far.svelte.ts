import type { Batch } from '../core/batch/types.ts';
import type { SummaryRow } from '../core/review/summary-row.ts';
import type { BenchState } from './bench-state.svelte.ts';
import { later, type Later } from './load-later.ts';
import { offsetMinutesAt } from './shift-zone.ts';

type ShiftSource = Pick<BenchState, 'log' | 'bench' | 'now'>;

/**
 * The two numbers of the running shift that stand on the bench page: from the batches at hand, and from the rows of
 * those closed earlier. A batch that closes now is still at hand, so that no number falls until its row is read.
 */
export class ShiftSoFar {
  readonly #state: ShiftSource;
  /** How they are reckoned, once it is loaded. */
  #reckoning = $state.raw<Pick<Later, 'shiftOf' | 'shiftWindow'> | null>(null);
  #rows = $state.raw<readonly SummaryRow[]>([]);
  #closed = '';
  #reading = 0;

  /** A window lasts for hours: it is looked up once a minute. */
  readonly #minute = $derived.by(() => Math.floor(this.#state.now.wall / 60_000));
  readonly #window = $derived.by(() =>
    this.#reckoning?.shiftWindow(this.#state.bench.wide.shifts, this.#minute * 60_000, offsetMinutesAt),
  );

  /** Null until they are read. */
  readonly numbers = $derived.by(() => {
    if (!this.#reckoning || !this.#window) return null;
    const { fromWallMs, toWallMs } = this.#window;
    const summary = this.#reckoning.shiftOf(this.#rows, Object.values(this.#state.bench.batches), fromWallMs, toWallMs);
    return {
      passed: summary.passed,
      sentBack: summary.sendBacks.reduce((sum, { connectors }) => sum + connectors, 0),
    };
  });

  constructor(state: ShiftSource) {
    this.#state = state;
    // The page first shows what is read already.
    setTimeout(() => void this.#read(), 0);
    state.log.subscribe(() => {
      const closed = closedIds(state.log.bench.batches);
      if (closed === this.#closed) return;
      this.#closed = closed;
      void this.#read();
    });
  }

  /** Rows that were read for an earlier shift hold those of a later one too. */
  async #read(): Promise<void> {
    this.#reading += 1;
    const reading = this.#reading;
    try {
      const reckoning = await later();
      const { fromWallMs } = reckoning.shiftWindow(
        this.#state.bench.wide.shifts,
        this.#minute * 60_000,
        offsetMinutesAt,
      );
      const rows = await this.#state.log.summaryRows(fromWallMs);
      if (reading !== this.#reading) return;
      this.#reckoning = reckoning;
      this.#rows = rows;
    } catch {
      // The store does not answer: the next write says so, and the numbers stay as they were.
    }
  }
}

function closedIds(batches: Readonly<Record<string, Batch>>): string {
  return Object.values(batches)
    .filter(({ closed }) => closed !== null)
    .map(({ id }) => id)
    .join(' ');
}
