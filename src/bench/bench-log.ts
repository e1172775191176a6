import type { ReadRecipe } from '../core/batch/apply-wide.ts';
import { foldBatch, foldWide, noteEntries } from '../core/batch/fold.ts';
import type { Batch, Bench, Misfit } from '../core/batch/types.ts';
import type { Command } from '../core/command/commands.ts';
import { decide } from '../core/command/decide.ts';
import type { Refusal } from '../core/command/refusal.ts';
import { benchNow } from '../core/event/bench-time.ts';
import { benchWide, type Draft, type Entry, type Head, type Line } from '../core/event/entry.ts';
import { makeLines } from '../core/event/line.ts';
import { readSummaryRow } from '../core/review/read-summary-row.ts';
import { summaryKeysFrom, summaryRow, type SummaryRow } from '../core/review/summary-row.ts';
import type { Moment } from '../core/unit/moment.ts';
import { failed, ok, type Result } from '../core/unit/result.ts';
import type { LogStore } from '../log/store.ts';
import { derivedRows, rowKeys } from './derived-rows.ts';
import { loadBench, readLines, type Loaded, type Unreadable } from './load-bench.ts';

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

/**
 * The bench as this tablet knows it, and the one way to add to its log. Commands are taken one after the other; what
 * is shown changes only once it is saved.
 */
export class BenchLog {
  #options: BenchLogOptions;
  #loaded: Loaded;
  #queue: Promise<unknown> = Promise.resolve();
  #listeners = new Set<() => void>();

  private constructor(options: BenchLogOptions, loaded: Loaded) {
    this.#options = options;
    this.#loaded = loaded;
  }

  /** Reads what is open and writes the first entry of this page. */
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

  /** Decides, writes and only then shows; a refusal leaves no entry. */
  ask(command: Command): Promise<Answer> {
    return this.#inTurn(async () => {
      for (let attempt = 1; ; attempt += 1) {
        const decision = decide(this.bench, command, { now: this.now, by: this.#by });
        if (!decision.ok) return decision;
        const answer = await this.#append(decision.value);
        if (answer !== 'moved') return answer;
        if (attempt === mostTries) return notSaved([], 'another window keeps writing');
        await this.#reload();
      }
    });
  }

  /** Writes entries that nobody decides: what the tablet itself noticed. */
  write(drafts: readonly Draft[]): Promise<Answer> {
    return this.#inTurn(async () => {
      for (let attempt = 1; ; attempt += 1) {
        const answer = await this.#append(drafts);
        if (answer !== 'moved') return answer;
        if (attempt === mostTries) return notSaved([], 'another window keeps writing');
        await this.#reload();
      }
    });
  }

  /** Brings a closed batch back into view, to show or to reopen it. */
  async fetchBatch(id: string): Promise<Batch | null> {
    return this.#inTurn(async () => {
      const known = this.bench.batches[id];
      if (known) return known;
      const { entries, unreadable } = readLines(await this.#options.store.linesOfBatch(id));
      const { batch } = foldBatch(entries, this.bench.wide.recipes);
      if (!batch) return null;
      const bench = {
        ...this.bench,
        batches: { ...this.bench.batches, [id]: batch },
        entries: { ...this.bench.entries, [id]: entries },
      };
      this.#show({ ...this.#loaded, bench, unreadable: [...this.unreadable, ...unreadable] });
      return batch;
    });
  }

  /** Reads the bench-wide entries of all time, so that one of them can be taken back. */
  async fetchBenchWide(): Promise<readonly Entry[]> {
    return this.#inTurn(async () => {
      const { entries } = readLines(await this.#options.store.linesOfBatch(benchWide));
      this.#show({
        ...this.#loaded,
        bench: { ...this.bench, entries: { ...this.bench.entries, [benchWide]: entries } },
      });
      return entries;
    });
  }

  /**
   * What closed batches left behind that can tell of something at `fromWallMs` or later. A row of another version, or
   * a damaged one, is made anew from the lines of its batch.
   */
  async summaryRows(fromWallMs: number): Promise<readonly SummaryRow[]> {
    const { store } = this.#options;
    const { lower, upper } = summaryKeysFrom(fromWallMs);
    return this.#inTurn(async () => {
      const rows: SummaryRow[] = [];
      for (const { key, value } of await store.derivedBetween(lower, upper)) {
        const read = readSummaryRow(value);
        if (read.ok) rows.push(read.value);
        else {
          const id = key.split(':').slice(2).join(':');
          const { batch } = foldBatch(readLines(await store.linesOfBatch(id)).entries, this.bench.wide.recipes);
          const row = batch && summaryRow(batch);
          if (row) rows.push(row);
        }
      }
      return rows;
    });
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

  async #append(drafts: readonly Draft[]): Promise<Answer | 'moved'> {
    if (drafts.length === 0) return ok([]);
    const { own, head, heads, seen } = this.#loaded;
    const stamp = { ...this.#options.clock.stamp(), log: own, by: this.#by, seen };
    const made = makeLines(head, drafts, stamp);
    const { entries } = readLines(made.lines.map(({ text }) => text));
    const allHeads = [...heads.filter(({ log }) => log !== own), made.head];
    const bench = extendBench(this.bench, entries, this.#options.readRecipe);
    const now = { log: own, bench: made.head.bench, wall: made.head.wall };
    const derived = derivedRows(this.bench, bench, drafts, allHeads, now);
    if (!head) derived.push({ key: rowKeys.own, value: own });
    try {
      const appended = await this.#options.store.append(head, made.lines, made.head, derived);
      if (appended === 'moved') return 'moved';
    } catch (error) {
      return notSaved(made.lines, error instanceof Error ? error.message : String(error));
    }
    this.#show({ ...this.#loaded, bench, head: made.head, heads: allHeads });
    return ok(entries);
  }

  async #reload(): Promise<void> {
    const { store, readRecipe, randomId } = this.#options;
    this.#show(await loadBench(store, readRecipe, randomId));
  }

  #show(loaded: Loaded): void {
    this.#loaded = loaded;
    for (const listener of this.#listeners) listener();
  }
}

const notSaved = (lines: readonly Line[], why: string) => failed({ code: 'not saved', lines, why } as const);

/** The bench with entries added that are later than all it knows. A void refolds its batch, or all bench-wide state. */
export function extendBench(bench: Bench, added: readonly Entry[], readRecipe: ReadRecipe): Bench {
  const entries: Record<string, readonly Entry[]> = { ...bench.entries };
  for (const entry of added) entries[entry.batch] = [...(entries[entry.batch] ?? []), entry];
  const wideAdded = added.filter(({ batch }) => batch === benchWide);
  let wide = noteEntries(bench.wide, added);
  wide = wideAdded.some(({ type }) => type === 'voided')
    ? withoutVoided(wide, wideAdded, entries[benchWide] ?? [], readRecipe)
    : foldWide(wideAdded, readRecipe, wide);
  const batches: Record<string, Batch> = { ...bench.batches };
  for (const id of new Set(added.map(({ batch }) => batch))) {
    if (id === benchWide) continue;
    const { batch, misfits } = foldBatch(entries[id] ?? [], wide.recipes);
    if (batch) batches[id] = batch;
    else delete batches[id];
    if (!batch && misfits.length > 0) wide = { ...wide, misfits: [...wide.misfits, ...misfits] };
  }
  return { wide, batches, entries };
}

/** Takes mixes and oven entries out of a register whose earlier entries are not all at hand. */
function withoutVoided(
  wide: Bench['wide'],
  added: readonly Entry[],
  known: readonly Entry[],
  readRecipe: ReadRecipe,
): Bench['wide'] {
  const targets = added.flatMap((entry) => (entry.type === 'voided' ? entry.data.targets : []));
  const gone = new Set(targets.map(({ log, seq }) => `${log} ${seq}`));
  const mixes = new Set(
    known.flatMap((entry) =>
      gone.has(`${entry.log} ${entry.seq}`) && entry.type === 'adhesiveMixed' ? [entry.data.mix] : [],
    ),
  );
  const kept = {
    ...wide,
    mixes: Object.fromEntries(Object.entries(wide.mixes).filter(([id]) => !mixes.has(id))),
    ovens: Object.fromEntries(
      Object.entries(wide.ovens).map(([id, oven]) => [
        id,
        { ...oven, history: oven.history.filter(({ entry }) => !gone.has(`${entry.log} ${entry.seq}`)) },
      ]),
    ),
  };
  return foldWide(
    added.filter(({ type }) => type !== 'voided'),
    readRecipe,
    kept,
  );
}
