import { foldBatch } from '../../../src/core/batch/fold.ts';
import type { MisfitReason } from '../../../src/core/batch/misfit-reasons.ts';
import type { Batch, TakenRecipe } from '../../../src/core/batch/types.ts';
import type { Entry } from '../../../src/core/event/entry.ts';
import type { Fact } from '../../../src/core/event/facts.ts';

export interface WrittenAt {
  readonly log?: string;
  readonly benchMs: number;
  readonly wallMs: number;
  readonly by?: string;
}

/** The entries of one batch, in the order in which they are written down. */
export class DayBook {
  readonly entries: Entry[] = [];
  readonly #batch: string;
  readonly #recipes: Readonly<Record<string, TakenRecipe>>;

  constructor(batch: string, recipes: Readonly<Record<string, TakenRecipe>>) {
    this.#batch = batch;
    this.#recipes = recipes;
  }

  write({ log = 'log-a', benchMs, wallMs, by = 'MK' }: WrittenAt, fact: Fact): void {
    const seq = this.entries.length + 1;
    this.entries.push({
      log,
      seq,
      time: String(seq).padStart(15, '0'),
      bench: benchMs,
      wall: wallMs,
      mono: benchMs,
      page: 'page',
      offset: 0,
      zone: 'UTC',
      by,
      batch: this.#batch,
      prev: '',
      ...fact,
    });
  }

  /** The batch as it stands; an entry that does not fit, for another reason than the one given, is a mistake of the test. */
  batch(mayMisfit?: MisfitReason): Batch {
    const { batch, misfits } = foldBatch(this.entries, this.#recipes);
    const wrong = misfits.filter(({ why }) => why !== mayMisfit);
    if (!batch || wrong.length > 0) throw new Error(`does not fit: ${JSON.stringify(wrong)}`);
    return batch;
  }
}
