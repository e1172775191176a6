import { firstFreeTag, tagsTaken } from '../core/command/decide-open.ts';
import { largestLoad } from '../core/recipe/largest-load.ts';
import type { Recipe } from '../core/recipe/schema.ts';
import { parseNumber } from '../ui/parse-number.ts';
import { refusalSentence } from '../words/refusal-sentence.ts';
import type { Words } from '../words/index.ts';
import type { BenchState } from './bench-state.svelte.ts';
import { numberProblem } from './number-problem.ts';
import { serialsFrom } from './serial-pattern.ts';

export interface OfferedRecipe {
  readonly text: string;
  readonly recipe: Recipe;
}

/** The ways in which a technician looks a recipe up: what the work order says of the connector. */
export interface Filter {
  readonly ferrule: string | null;
  readonly fibre: string | null;
  readonly polish: string | null;
}

export const ferruleKey = ({ fits }: Recipe): string => (fits.terminus ? 'terminus' : String(fits.ferruleMm));

export function fitting(offered: readonly OfferedRecipe[], filter: Filter): OfferedRecipe[] {
  return offered.filter(({ recipe }) => {
    const { fits } = recipe;
    if (filter.ferrule !== null && ferruleKey(recipe) !== filter.ferrule) return false;
    if (filter.fibre !== null && fits.fibreKind !== filter.fibre) return false;
    return filter.polish === null || fits.polish === filter.polish;
  });
}

/** How many connectors one mix serves at the standard times; null where the recipe mixes nothing. */
export function mixServes(recipe: Recipe): number | null {
  const mix = recipe.steps.findIndex((step) => step.kind === 'mix');
  return mix < 0 ? null : largestLoad(recipe, mix);
}

/** What was typed and chosen on the page that starts a batch, and what is wrong with it, at each field. */
export class NewBatch {
  readonly #bench: BenchState;
  readonly #words: Words;
  readonly #newId: () => string;
  workOrder = $state('');
  count = $state('12');
  chosen = $state.raw<OfferedRecipe | null>(null);
  tag = $state<number | null>(null);
  withSerials = $state(false);
  firstSerial = $state('');
  problems = $state.raw<Partial<Record<'workOrder' | 'count' | 'recipe' | 'serials' | 'other', string>>>({});

  readonly taken = $derived.by(() => tagsTaken(this.#bench.bench));
  readonly tagShown = $derived.by(() => this.tag ?? firstFreeTag(this.#bench.bench));
  readonly number = $derived(parseNumber(this.count, { lowest: 1, highest: 1000, unit: '', decimals: 0 }));

  constructor(bench: BenchState, words: Words, newId: () => string) {
    this.#bench = bench;
    this.#words = words;
    this.#newId = newId;
  }

  /** Starts the batch and answers with its id, or puts a sentence at each field that is wrong. */
  async start(): Promise<string | null> {
    this.problems = {};
    const words = this.#words;
    const { number, chosen } = this;
    const serials =
      this.withSerials && number.ok ? serialsFrom(this.firstSerial, number.value) : { ok: true as const, value: [] };
    const problems: typeof this.problems = {};
    if (this.workOrder.trim() === '')
      problems.workOrder = words.refusal['work order empty']({ code: 'work order empty' });
    if (!number.ok) problems.count = numberProblem(words, number.error);
    if (!chosen) problems.recipe = words.newBatch.chooseRecipe;
    if (!serials.ok) problems.serials = words.newBatch.serialNoNumber;
    this.problems = problems;
    if (!number.ok || !chosen || !serials.ok || Object.keys(problems).length > 0) return null;
    const batch = this.#newId();
    const answer = await this.#bench.ask({
      type: 'open batch',
      batch,
      tag: this.tagShown,
      workOrder: this.workOrder,
      recipeText: chosen.text,
      connectors: Array.from({ length: number.value }, (_, index) => {
        const serial = serials.value[index];
        return serial === undefined ? {} : { serial };
      }),
    });
    if (answer.ok) return batch;
    if (answer.error.code === 'not saved') return null;
    const place = placeOf(answer.error.code, 'field' in answer.error ? answer.error.field : '');
    this.problems = { [place]: refusalSentence(words, answer.error) };
    return null;
  }
}

function placeOf(code: string, field: string): 'workOrder' | 'count' | 'serials' | 'recipe' | 'other' {
  if (code === 'connectors out of range') return 'count';
  if (code === 'serial twice' || field === 'serial') return 'serials';
  if (code === 'recipe not usable') return 'recipe';
  return field === 'work order' || code === 'work order empty' ? 'workOrder' : 'other';
}
