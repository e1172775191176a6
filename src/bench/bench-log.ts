import type { ReadRecipe } from '../core/batch/apply-wide.ts';
import { foldBatch } from '../core/batch/fold.ts';
import type { Batch, Bench, Misfit } from '../core/batch/types.ts';
import type { Command } from '../core/command/commands.ts';
import type { Refusal } from '../core/command/refusal.ts';
import { benchNow } from '../core/event/bench-time.ts';
import { benchWide, type Draft, type Entry, type Head, type Line } from '../core/event/entry.ts';
import { makeLines } from '../core/event/line.ts';
import type { SummaryRow } from '../core/review/summary-row.ts';
import type { Moment } from '../core/unit/moment.ts';
import { failed, ok, type Result } from '../core/unit/result.ts';
import type { LogStore } from '../log/store.ts';
import { Doubts, type Doubt } from './doubts.ts';
import { extendBench, wholeWide } from './extend-bench.ts';
import { decide, derivedRows, later, readSummaryRows } from './load-later.ts';
import { loadBench, type Loaded } from './load-bench.ts';
import { readLines, type Unreadable } from './read-lines.ts';
import { registerRow, registerText } from './register-row.ts';
import { rowKeys } from './row-keys.ts';

/** What the log needs to know of the tablet at the instant of writing. Times in ms, `offset` in minutes. */
export interface TabletClock {
  stamp(): { wall: number; mono: number; page: string; offset: number; zone: string };
}

export interface BenchLogOptions {
  readonly store: LogStore;
  readonly clock: TabletClock;
  readonly readRecipe: ReadRecipe;
  readonly randomId: () => string;
  /** Name and version of the program, for the first entry of each page. */
  readonly app: string;
}

/** Lines that could not be saved; they are kept so that they can be offered as a file. */
export interface NotSaved {
  readonly code: 'not saved';
  readonly lines: readonly Line[];
  readonly why: string;
}

export type Answer = Result<readonly Entry[], Refusal | NotSaved>;

/** How often a command is decided again because another window wrote in between. */
const mostTries = 3;
/** Stands for what the tablet itself noticed, among commands. */
const noticed = '';

/**
 * The bench as this tablet knows it, and the one way to add to its log. Commands are taken one after the other; what
 * is shown changes only once it is saved.
 */
export class BenchLog {
  readonly #options: BenchLogOptions;
  #loaded: Loaded;
  #queue: Promise<unknown> = Promise.resolve();
  readonly #listeners = new Set<() => void>();
  /** What must be on record before anything else, since bench time rests on it. */
  #owed: readonly Draft[] = [];
  readonly #doubts = new Doubts();

  private constructor(options: BenchLogOptions, loaded: Loaded) {
    this.#options = options;
    this.#loaded = loaded;
  }

  /**
   * Reads what is open and writes the first entry of this page. Where that entry cannot be saved the bench can still be
   * read, and it is written before the next one; `write([])` tells.
   */
  static async start(options: BenchLogOptions): Promise<BenchLog> {
    const loaded = await loadBench(options.store, options.readRecipe, options.randomId);
    const log = new BenchLog(options, loaded);
    await log.write([{ batch: benchWide, type: 'tabletStarted', v: 1, data: { app: options.app } }]);
    return log;
  }

  get bench(): Bench {
    return this.#loaded.bench;
  }

  get head(): Head | null {
    return this.#loaded.head;
  }

  /** Stored lines that this version cannot read; nothing is done to them. */
  get unreadable(): readonly Unreadable[] {
    return this.#loaded.unreadable;
  }

  get misfits(): readonly Misfit[] {
    return [...this.bench.wide.misfits, ...Object.values(this.bench.batches).flatMap(({ misfits }) => misfits)];
  }

  get now(): Moment {
    const { wall, mono, page } = this.#options.clock.stamp();
    const { head, own } = this.#loaded;
    const reading = { wall: Math.floor(wall), mono: Math.floor(mono), page };
    return { log: own, bench: head ? benchNow(head, reading) : reading.wall, wall: reading.wall };
  }

  /** Calls back after every change; answers with how to stop. */
  subscribe(listener: () => void): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }

  /**
   * Decides, writes and only then shows; a refusal leaves no entry. A command that is asked again because nobody heard
   * whether it was saved is not doubled.
   */
  ask(command: Command): Promise<Answer> {
    const asked = JSON.stringify(command);
    return this.#inTurn(() =>
      this.#trying(async () => {
        const heard = await this.#hear();
        if (heard?.asked === asked) return ok(heard.entries);
        const first = await this.#writeOwed();
        if (first === 'moved' || !first.ok) return first;
        await this.#bringToHand(command);
        const decision = await decide(this.bench, command, { now: this.now, by: this.#by });
        return decision.ok ? this.#append(decision.value, asked) : decision;
      }),
    );
  }

  /**
   * Writes entries that nobody decides: what the tablet itself noticed. Where they cannot be saved, they are written
   * before the next entry.
   */
  write(drafts: readonly Draft[]): Promise<Answer> {
    this.#owed = [...this.#owed, ...drafts];
    return this.#inTurn(() =>
      this.#trying(async () => {
        await this.#hear();
        return this.#writeOwed();
      }),
    );
  }

  /** Brings a closed batch back into view, to show or to reopen it. */
  fetchBatch(id: string): Promise<Batch | null> {
    return this.#inTurn(() => this.#fetchBatch(id));
  }

  /** Reads the bench-wide entries of all time, so that one of them can be taken back. */
  fetchBenchWide(): Promise<readonly Entry[]> {
    return this.#inTurn(async () => {
      await this.#fetchBenchWide();
      return this.bench.entries[benchWide] ?? [];
    });
  }

  /**
   * What closed batches left behind that can tell of something at `fromWallMs` or later. A row of another version, or
   * a damaged one, is made anew from the lines of its batch.
   */
  summaryRows(fromWallMs: number): Promise<readonly SummaryRow[]> {
    return this.#inTurn(() => readSummaryRows(this.#options.store, this.bench.wide.recipes, fromWallMs));
  }

  /** Resolves when nothing is being written or read any more. */
  async idle(): Promise<void> {
    await this.#queue;
  }

  close(): void {
    this.#listeners.clear();
    this.#options.store.close();
  }

  get #by(): string {
    return this.bench.wide.onShift?.operator ?? '';
  }

  #inTurn<Value>(work: () => Promise<Value>): Promise<Value> {
    const turn = this.#queue.then(work, work);
    this.#queue = turn.catch(() => undefined);
    return turn;
  }

  /** Tries again on the news of another window. What the store throws becomes an answer, as does an unfit value. */
  async #trying(attempt: () => Promise<Answer | 'moved'>): Promise<Answer> {
    try {
      for (let tries = 1; tries <= mostTries; tries += 1) {
        const answer = await attempt();
        if (answer !== 'moved') return answer;
        await this.#reload();
      }
      return this.#notSaved('another window keeps writing');
    } catch (error) {
      const why = error instanceof Error ? error.message : String(error);
      return error instanceof RangeError ? failed({ code: 'does not fit', why }) : this.#notSaved(why);
    }
  }

  async #writeOwed(): Promise<Answer | 'moved'> {
    const owed = this.#owed;
    if (owed.length === 0) return ok([]);
    const answer = await this.#append(owed, noticed);
    if (answer !== 'moved' && answer.ok) this.#owed = this.#owed.slice(owed.length);
    return answer;
  }

  /** Whether lines in doubt were saved after all: then their command is done. */
  async #hear(): Promise<Doubt | null> {
    const doubt = await this.#doubts.saved(this.#options.store);
    if (!doubt) return null;
    await this.#reload();
    this.#doubts.clear();
    if (doubt.asked === noticed) this.#owed = this.#owed.slice(doubt.lines.length);
    return doubt;
  }

  async #append(drafts: readonly Draft[], asked: string): Promise<Answer | 'moved'> {
    if (drafts.length === 0) return ok([]);
    const { own, head, heads, seen, unreadable } = this.#loaded;
    const stamp = { ...this.#options.clock.stamp(), log: own, by: this.#by, seen };
    const made = makeLines(head, drafts, stamp);
    const { entries } = readLines(
      made.lines.map(({ text }) => text),
      benchWide,
    );
    const allHeads = [...heads.filter(({ log }) => log !== own), made.head];
    const bench = extendBench(this.bench, entries, this.#options.readRecipe);
    const now = { log: own, bench: made.head.bench, wall: made.head.wall };
    const register = registerText(registerRow(bench, allHeads, unreadable, now));
    const derived = [{ key: rowKeys.wide, value: register }, ...(await derivedRows(this.bench, bench, drafts))];
    if (!head) derived.push({ key: rowKeys.own, value: own });
    try {
      const appended = await this.#options.store.append(head, made.lines, made.head, derived);
      if (appended === 'moved') return 'moved';
    } catch (error) {
      this.#doubts.add({ asked, lines: made.lines, entries });
      throw error;
    }
    // Another line follows the head now, so none in doubt can arrive any more.
    this.#doubts.clear();
    this.#show({ ...this.#loaded, bench, head: made.head, heads: allHeads });
    return ok(entries);
  }

  /** Reads what a command rests on and a start leaves aside. */
  async #bringToHand(command: Command): Promise<void> {
    const { batchesWithMix, batchToFetch, mixesInQuestion, needsBenchWide } = await later();
    const batch = batchToFetch(this.bench, command);
    if (batch !== null) await this.#fetchBatch(batch);
    if (needsBenchWide(this.bench, command)) await this.#fetchBenchWide();
    const { store } = this.#options;
    for (const mixed of mixesInQuestion(this.bench, command)) {
      for (const id of await batchesWithMix(store, this.#loaded.heads, mixed)) await this.#fetchBatch(id);
    }
  }

  async #fetchBatch(id: string): Promise<Batch | null> {
    const known = this.bench.batches[id];
    if (known) return known;
    const read = readLines(await this.#options.store.linesOfBatch(id), id);
    if (read.entries.length === 0) return null;
    // Its mixes and ovens may be older than what open work needs.
    await this.#fetchBenchWide();
    const { batch } = foldBatch(read.entries, this.bench.wide.recipes);
    const batches = batch ? { ...this.bench.batches, [id]: batch } : this.bench.batches;
    const bench = { ...this.bench, batches, entries: { ...this.bench.entries, [id]: read.entries } };
    this.#show({ ...this.#loaded, bench, unreadable: this.#alsoUnreadable(id, read.unreadable) });
    return batch;
  }

  async #fetchBenchWide(): Promise<void> {
    if (this.#loaded.whole) return;
    const { entries, unreadable } = readLines(await this.#options.store.linesOfBatch(benchWide), benchWide);
    const wide = wholeWide(this.bench.wide, entries, this.#options.readRecipe);
    const bench = { ...this.bench, wide, entries: { ...this.bench.entries, [benchWide]: entries } };
    this.#show({ ...this.#loaded, bench, whole: true, unreadable: this.#alsoUnreadable(benchWide, unreadable) });
  }

  #alsoUnreadable(batch: string, found: readonly Unreadable[]): readonly Unreadable[] {
    return [...this.unreadable.filter((each) => each.batch !== batch), ...found];
  }

  /** What was in view stays in view. */
  async #reload(): Promise<void> {
    const { store, readRecipe, randomId } = this.#options;
    const inView = Object.keys(this.bench.batches);
    this.#show(await loadBench(store, readRecipe, randomId));
    for (const id of inView) await this.#fetchBatch(id);
  }

  #notSaved(why: string): Answer {
    return failed({ code: 'not saved', lines: this.#doubts.lines, why });
  }

  #show(loaded: Loaded): void {
    this.#loaded = loaded;
    for (const listener of this.#listeners) listener();
  }
}
