import type { Command, NamedConnector } from '../../core/command/commands.ts';
import { cureOf } from '../../core/cure/cure.ts';
import { isTimed, standardSecondsOf, stepIndex, type TimedStep } from '../../core/recipe/read.ts';
import type { Recipe, Step } from '../../core/recipe/schema.ts';
import { clockId } from '../../core/timer/clock.ts';
import type { ShippedRecipe } from '../shipped-recipes.ts';

/** A command and when it is given, in ms after the course began or, once it is placed, before now (negative). */
export interface Planned {
  readonly atMs: number;
  readonly command: Command;
}

export interface CourseOptions {
  readonly batch: string;
  readonly tag: number;
  readonly workOrder: string;
  readonly recipe: ShippedRecipe;
  readonly connectors: readonly NamedConnector[];
  readonly oven: string;
  readonly randomId: () => string;
}

/** Hands are slower than the standard, since other batches want them too. */
const pace = 1.4;

/** The way of one batch through its recipe, at a steady pace. */
export class Course {
  readonly planned: Planned[] = [];
  readonly batch: string;
  readonly recipe: Recipe;
  readonly all: readonly number[];
  readonly #options: CourseOptions;
  #atMs = 0;
  /** The load that a cure's end starts by itself. */
  #cooling = '';

  constructor(options: CourseOptions) {
    this.#options = options;
    this.batch = options.batch;
    this.recipe = options.recipe.recipe;
    this.all = options.connectors.map((_, index) => index + 1);
    const { batch, tag, workOrder, connectors } = options;
    this.give({ type: 'open batch', batch, tag, workOrder, recipeText: options.recipe.text, connectors });
  }

  /** Gives a command after so many seconds of work. */
  give(command: Command, workS = 20): this {
    return this.wait(workS * 1000).#add(command);
  }

  wait(ms: number): this {
    this.#atMs += ms;
    return this;
  }

  /** Does every step from one to another, both included, for some connectors. */
  through(first: string, last: string, numbers: readonly number[] = this.all): this {
    const from = stepIndex(this.recipe, first) ?? 0;
    const to = stepIndex(this.recipe, last) ?? -1;
    for (const step of this.recipe.steps.slice(from, to + 1)) this.#doStep(step, numbers);
    return this;
  }

  /** Begins a timed step and leaves it running. */
  begin(id: string, numbers: readonly number[] = this.all): this {
    this.#begin(timedStep(this.recipe, id), numbers);
    return this;
  }

  /** Goes through a cure whose end is seen late, and whose tray comes out later still, in seconds. */
  lateCure(id: string, seenLateS: number, lateS: number): this {
    const load = this.#seenCure(id, seenLateS);
    this.#cooling = this.#options.randomId();
    const command: Command = { type: 'end load', batch: this.batch, load, nextLoad: this.#cooling };
    return this.give(command, lateS - seenLateS);
  }

  /** Goes through a cure whose end is seen so many seconds late, and leaves the tray in. */
  seenCure(id: string, lateS: number): this {
    this.#seenCure(id, lateS);
    return this;
  }

  /** The course so placed that it begins at `firstMs`. */
  beginningAt(firstMs: number): Planned[] {
    return this.#placed(firstMs - (this.planned[0]?.atMs ?? 0));
  }

  /** The course so placed that its last command so far is given at `lastMs`. */
  endingAt(lastMs: number): Planned[] {
    return this.#placed(lastMs - (this.planned.at(-1)?.atMs ?? 0));
  }

  #placed(byMs: number): Planned[] {
    return this.planned.map(({ atMs, command }) => ({ atMs: atMs + byMs, command }));
  }

  #add(command: Command): this {
    this.planned.push({ atMs: this.#atMs, command });
    return this;
  }

  #doStep(step: Step, numbers: readonly number[]): void {
    for (const some of partsOf(step, numbers)) {
      const on = { batch: this.batch, step: step.id, connectors: some };
      const workS = standardSecondsOf(step, some.length) * pace;
      if (isTimed(step)) this.#runThrough(step, some);
      else if (step.kind === 'inspect' || step.kind === 'measure') this.give({ type: 'pass', ...on }, workS);
      else if (step.kind === 'mix') this.#mix(some, workS);
      else this.give({ type: 'finish step', ...on }, workS);
    }
  }

  #mix(connectors: readonly number[], workS: number): void {
    const mix = this.#options.randomId();
    this.give({ type: 'mix adhesive', batch: this.batch, connectors, mix, lot: 'DEMO-0815', roomC: 22 }, workS);
  }

  #runThrough(step: TimedStep, numbers: readonly number[]): void {
    const load = step.kind === 'wait' ? this.#cooling : this.#begin(step, numbers);
    this.#cooling = this.#options.randomId();
    const command: Command = { type: 'end load', batch: this.batch, load, nextLoad: this.#cooling };
    this.wait(spanMs(this.recipe, step)).give(command, 2);
  }

  #seenCure(id: string, lateS: number): string {
    const step = timedStep(this.recipe, id);
    const load = this.#begin(step, this.all);
    const clock = clockId('cure', load, this.batch);
    this.wait(spanMs(this.recipe, step)).give({ type: 'see clock', batch: this.batch, clock, lateS }, lateS);
    return load;
  }

  #begin(step: TimedStep, connectors: readonly number[]): string {
    const load = this.#options.randomId();
    const station = step.kind === 'cure' ? this.#options.oven : '';
    const command: Command = { type: 'start load', batch: this.batch, step: step.id, load, station, connectors };
    this.give(command, standardSecondsOf(step, connectors.length) * pace);
    return load;
  }
}

function partsOf(step: Step, numbers: readonly number[]): readonly (readonly number[])[] {
  const size = step.goes === 'connector by connector' ? 1 : (step.loadSize ?? numbers.length);
  const parts: (readonly number[])[] = [];
  for (let at = 0; at < numbers.length; at += size) parts.push(numbers.slice(at, at + size));
  return parts;
}

export function timedStep(recipe: Recipe, id: string): TimedStep {
  const step = recipe.steps[stepIndex(recipe, id) ?? -1];
  if (!step || !isTimed(step)) throw new RangeError(`${id} is no timed step of ${recipe.id}`);
  return step;
}

/** How long a timed step has to run, in ms; a cure at its set point. */
export function spanMs(recipe: Recipe, step: TimedStep): number {
  if (step.kind === 'wait') return step.atLeastS * 1000;
  if (step.kind === 'polish') return step.until.kind === 'time' ? step.until.aimS * 1000 : 0;
  const from = { log: '', bench: 0, wall: 0 };
  return cureOf({ from, setPointC: step.setPointC, adhesive: recipe.adhesive, oven: [] }).dueMs ?? 0;
}
