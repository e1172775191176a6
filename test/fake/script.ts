import { foldBench } from '../../src/core/batch/fold.ts';
import type { Batch, Bench } from '../../src/core/batch/types.ts';
import type { Command } from '../../src/core/command/commands.ts';
import type { Decision } from '../../src/core/command/context.ts';
import { decide } from '../../src/core/command/decide.ts';
import { benchNow } from '../../src/core/event/bench-time.ts';
import type { Draft, Entry, Head } from '../../src/core/event/entry.ts';
import { sha256 } from '../../src/core/event/hash.ts';
import { makeLines } from '../../src/core/event/line.ts';
import type { Recipe } from '../../src/core/recipe/schema.ts';
import type { Moment } from '../../src/core/unit/moment.ts';
import { smallRecipe } from './small-recipe.ts';

/** A tablet on counted time: plays commands through decide into a log and folds it, with nothing real behind it. */
export class Script {
  wall: number;
  mono = 0;
  head: Head | null = null;
  entries: Entry[] = [];
  readonly log: string;
  by = 'MK';
  readonly recipes: readonly Recipe[];

  constructor(options: { log?: string; wall?: number; recipes?: readonly Recipe[]; entries?: readonly Entry[] } = {}) {
    this.log = options.log ?? 'log-a';
    this.wall = options.wall ?? Date.UTC(2026, 0, 12, 6, 0, 0);
    this.recipes = options.recipes ?? [smallRecipe];
    this.entries = [...(options.entries ?? [])];
    this.write([{ batch: 'bench', type: 'tabletStarted', v: 1, data: { app: 'test' } }]);
  }

  /** Lets time pass, in seconds. */
  wait(seconds: number): this {
    this.wall += seconds * 1000;
    this.mono += seconds * 1000;
    return this;
  }

  get now(): Moment {
    const page = `page-${this.log}`;
    const bench = this.head ? benchNow(this.head, { wall: this.wall, mono: this.mono, page }) : this.wall;
    return { log: this.log, bench, wall: this.wall };
  }

  get bench(): Bench {
    return foldBench(this.entries, (text) => this.recipes.find((recipe) => JSON.stringify(recipe) === text) ?? null);
  }

  batch(id: string): Batch {
    const found = this.bench.batches[id];
    if (!found) throw new Error(`no batch ${id}`);
    return found;
  }

  write(drafts: readonly Draft[]): void {
    const stamp = { wall: this.wall, mono: this.mono, page: `page-${this.log}`, log: this.log, offset: 0, zone: 'UTC' };
    const seen = this.entries.reduce<string | null>(
      (latest, { time }) => (time > (latest ?? '') ? time : latest),
      null,
    );
    const made = makeLines(this.head, drafts, { ...stamp, by: this.by, seen });
    this.head = made.head;
    for (const line of made.lines) this.entries.push(JSON.parse(line.text) as Entry);
    // One command, one instant: the next begins a millisecond later, so that commands can be told apart.
    this.wall += 1;
    this.mono += 1;
  }

  /** Asks; writes what was decided. */
  try(command: Command): Decision {
    const decision = decide(this.bench, command, { now: this.now, by: this.by });
    if (decision.ok) this.write(decision.value);
    return decision;
  }

  /** Asks for what must be granted. */
  do(command: Command): this {
    const decision = this.try(command);
    if (!decision.ok) throw new Error(`${command.type} refused: ${JSON.stringify(decision.error)}`);
    return this;
  }

  /** Opens a batch with the small recipe; it is taken into use beforehand, as its text is not a recipe file. */
  open(batch: string, connectors: number, recipe: Recipe = smallRecipe): this {
    const text = JSON.stringify(recipe);
    if (!this.bench.wide.recipes[sha256(text)]) {
      this.write([{ batch: 'bench', type: 'recipeTaken', v: 1, data: { hash: sha256(text), text } }]);
    }
    return this.do({
      type: 'open batch',
      batch,
      tag: null,
      workOrder: `WO ${batch}`,
      recipeText: text,
      connectors: Array.from({ length: connectors }, () => ({})),
    });
  }
}

/** The numbers from one to another, both included. */
export const from = (first: number, last: number): number[] =>
  Array.from({ length: last - first + 1 }, (_, index) => first + index);
