import type { Batch } from '../core/batch/types.ts';
import type { Command } from '../core/command/commands.ts';
import type { Refusal } from '../core/command/refusal.ts';
import { undoable } from '../core/command/decide-void.ts';
import type { Words } from '../words/index.ts';
import { refusalSentence } from '../words/refusal-sentence.ts';
import type { BenchState } from './bench-state.svelte.ts';
import { groupViews, type GroupView } from './batch-view.ts';
import { chosenOf, marksOf, tap } from './chosen.ts';
import { mainAction } from './main-action.ts';

/** What lies over the page and asks for more. */
export type Sheet =
  | { readonly kind: 'mix' | 'oven' | 'oven reading' | 'trouble' | 'late' | 'hold' | 'end short' }
  | { readonly kind: 'reason'; readonly command: Command; readonly refusal: Refusal };

/** The state of one batch page: which group is shown, what was tapped, what is asked. Nothing here outlives the page. */
export class BatchPage {
  readonly #bench: BenchState;
  readonly #words: Words;
  readonly #newId: () => string;
  readonly id: string;
  #shown = $state<string | null>(null);
  #tapped = $state.raw<ReadonlySet<number>>(new Set());
  sheet = $state.raw<Sheet | null>(null);
  problem = $state('');

  readonly batch: Batch | undefined = $derived.by(() => this.#bench.bench.batches[this.id]);
  readonly groups: readonly GroupView[] = $derived.by(() =>
    this.batch && !this.batch.closed ? groupViews(this.batch, this.#bench.readingsOf(this.id)) : [],
  );
  readonly view: GroupView | undefined = $derived(this.groups.find(({ key }) => key === this.#shown) ?? this.groups[0]);
  readonly chosen: readonly number[] = $derived(this.view ? chosenOf(this.view, this.#tapped) : []);
  readonly marks = $derived.by(() => (this.batch ? marksOf(this.batch, this.view, this.chosen, this.#words) : []));
  readonly main = $derived.by(() =>
    this.batch ? mainAction(this.batch, this.view, this.chosen, this.#words, this.#newId) : null,
  );
  readonly canUndo = $derived(this.batch !== undefined && undoable(this.batch).length > 0);

  constructor(bench: BenchState, words: Words, newId: () => string, id: string) {
    this.#bench = bench;
    this.#words = words;
    this.#newId = newId;
    this.id = id;
  }

  show(key: string): void {
    this.#shown = key;
    this.#tapped = new Set();
    this.problem = '';
  }

  tap(number: number): void {
    if (this.view) this.#tapped = tap(this.view, this.#tapped, number);
  }

  open(sheet: Sheet): void {
    this.problem = '';
    this.sheet = sheet;
  }

  close(): void {
    this.sheet = null;
    this.problem = '';
  }

  async press(): Promise<void> {
    const { main } = this;
    if (main?.does === 'sheet') this.open({ kind: main.sheet });
    if (main?.does === 'command') await this.ask(main.command);
  }

  /** Asks; what needs a reason opens the sheet for it, any other refusal is told where the thumb is. */
  async ask(command: Command): Promise<boolean> {
    const shown = this.view?.key ?? null;
    const answer = await this.#bench.ask(command);
    if (answer.ok) {
      // Who sends one back goes on with the others at the same step.
      if (command.type === 'send back') this.#shown = shown;
      this.#tapped = new Set();
      this.close();
      return true;
    }
    const refused = answer.error;
    if (refused.code === 'not saved') return false;
    if (refused.code === 'too early' || refused.code === 'too late' || refused.code === 'working life over') {
      this.open({ kind: 'reason', command, refusal: refused });
    } else this.problem = refusalSentence(this.#words, refused);
    return false;
  }
}

/** The same command, with the reason that it was refused for want of. */
export function withReason(command: Command, reason: string): Command {
  if (command.type === 'end load') return { ...command, reason };
  if (command.type === 'finish step') return { ...command, overrunReason: reason };
  return command;
}
