import type { ReadRecipe } from '../core/batch/apply-wide.ts';
import { emptyBenchWide } from '../core/batch/apply-wide.ts';
import { foldBatch, foldBench } from '../core/batch/fold.ts';
import { foldVersion } from '../core/batch/register.ts';
import type { Batch, Bench, BenchWide, TakenRecipe } from '../core/batch/types.ts';
import { type Entry, type Head, type Line } from '../core/event/entry.ts';
import { parseLine, type LineProblem } from '../core/event/line.ts';
import { inOrder } from '../core/event/order.ts';
import type { LogStore } from '../log/store.ts';
import { batchRows, registerRow, rowKeys, type RegisterRow } from './derived-rows.ts';

export interface Unreadable {
  readonly text: string;
  readonly problem: LineProblem;
}

export interface Loaded {
  readonly bench: Bench;
  /** The log that this tablet writes, and where it stands; null before its first line. */
  readonly own: string;
  readonly head: Head | null;
  readonly heads: readonly Head[];
  /** The latest time read of any other log. */
  readonly seen: string | null;
  readonly unreadable: readonly Unreadable[];
}

/** Lines as entries in total order; what cannot be read is kept apart and named. */
export function readLines(texts: readonly string[]): { entries: Entry[]; unreadable: Unreadable[] } {
  const entries: Entry[] = [];
  const unreadable: Unreadable[] = [];
  for (const text of texts) {
    const read = parseLine(text);
    if (read.ok) entries.push(read.value);
    else unreadable.push({ text, problem: read.error });
  }
  return { entries: inOrder(entries), unreadable };
}

/** What a start reads: where the logs stand, the register, and the entries of open batches. Not history. */
export async function loadBench(store: LogStore, readRecipe: ReadRecipe, randomId: () => string): Promise<Loaded> {
  const heads = await store.heads();
  const ownRows = await store.derived(rowKeys.own);
  const own = ownRows.find(({ key }) => key === rowKeys.own)?.value ?? randomId();
  const head = heads.find(({ log }) => log === own) ?? null;
  const others = heads.filter(({ log }) => log !== own).map(({ time }) => time);
  const seen = others.length === 0 ? null : others.reduce((latest, time) => (time > latest ? time : latest));
  const register = readRegister((await store.derived(rowKeys.wide))[0]?.value, heads);
  const { bench, unreadable } = register
    ? await loadOpen(store, register, readRecipe)
    : await rebuild(store, heads, readRecipe);
  return { bench, own, head, heads, seen, unreadable };
}

function readRegister(text: string | undefined, heads: readonly Head[]): RegisterRow | null {
  if (text === undefined) return heads.length === 0 ? emptyRegister : null;
  try {
    const row = JSON.parse(text) as RegisterRow;
    const current = heads.every(({ log, seq }) => row.heads[log] === seq);
    return row.fold === foldVersion && current && typeof row.wide === 'object' ? row : null;
  } catch {
    return null;
  }
}

const { recipes: _none, ...emptyWide } = emptyBenchWide;
const emptyRegister: RegisterRow = { fold: foldVersion, heads: {}, wide: emptyWide };

async function loadOpen(store: LogStore, row: RegisterRow, readRecipe: ReadRecipe) {
  const wide: BenchWide = { ...emptyBenchWide, ...row.wide, recipes: await loadRecipes(store, readRecipe) };
  const batches: Record<string, Batch> = {};
  const entries: Record<string, readonly Entry[]> = {};
  const unreadable: Unreadable[] = [];
  for (const { key } of await store.derived('open:')) {
    const id = key.slice('open:'.length);
    const read = readLines(await store.linesOfBatch(id));
    unreadable.push(...read.unreadable);
    entries[id] = read.entries;
    const { batch } = foldBatch(read.entries, wide.recipes);
    if (batch) batches[id] = batch;
  }
  return { bench: { wide, batches, entries }, unreadable };
}

async function loadRecipes(store: LogStore, readRecipe: ReadRecipe): Promise<Record<string, TakenRecipe>> {
  const recipes: Record<string, TakenRecipe> = {};
  for (const { key, value } of await store.derived('recipe:')) {
    const hash = key.slice('recipe:'.length);
    const recipe = readRecipe(value);
    if (recipe) recipes[hash] = { hash, recipe };
  }
  return recipes;
}

/** Makes every derived row anew from the whole log: after an upgrade of the fold, or where rows were lost. */
async function rebuild(store: LogStore, heads: readonly Head[], readRecipe: ReadRecipe) {
  const texts: string[] = [];
  const page = 10_000;
  let last: Line | undefined;
  for (;;) {
    const lines: Line[] = await store.lines(last, page);
    texts.push(...lines.map(({ text }) => text));
    last = lines.at(-1);
    if (lines.length < page) break;
  }
  const { entries, unreadable } = readLines(texts);
  const whole = foldBench(entries, readRecipe);
  const latest = entries.at(-1);
  const now = { log: latest?.log ?? '', bench: latest?.bench ?? 0, wall: latest?.wall ?? 0 };
  const taken = entries.flatMap((entry) => (entry.type === 'recipeTaken' ? [entry.data] : []));
  await store.putDerived([
    registerRow(whole, heads, now),
    ...taken.map(({ hash, text }) => ({ key: rowKeys.recipe(hash), value: text })),
    ...Object.values(whole.batches).flatMap((batch) => batchRows(undefined, batch, batch.id)),
  ]);
  return { bench: onlyOpen(whole), unreadable };
}

function onlyOpen(bench: Bench): Bench {
  const open = Object.values(bench.batches).filter((batch) => !batch.closed);
  return {
    wide: bench.wide,
    batches: Object.fromEntries(open.map((batch) => [batch.id, batch])),
    entries: Object.fromEntries(open.map(({ id }) => [id, bench.entries[id] ?? []])),
  };
}
