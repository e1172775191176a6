import { emptyBenchWide, type ReadRecipe } from '../core/batch/apply-wide.ts';
import { foldBatch } from '../core/batch/fold.ts';
import type { Batch, Bench, TakenRecipe } from '../core/batch/types.ts';
import { latestTime } from '../core/event/clock.ts';
import type { Entry, Head } from '../core/event/entry.ts';
import { sha256 } from '../core/event/hash.ts';
import type { DerivedRow, LogStore } from '../log/store.ts';
import { readLines, type Unreadable } from './read-lines.ts';
import { readRegister, type RegisterRow } from './register-row.ts';
import { rowKeys } from './row-keys.ts';

/** The bench as it was read, open work alone. */
export interface Found {
  readonly bench: Bench;
  readonly unreadable: readonly Unreadable[];
  /** Whether all bench-wide entries are at hand, or only those made since. */
  readonly whole: boolean;
  /** The latest time of any entry, where all were read. */
  readonly latest: string | null;
}

export interface Loaded extends Omit<Found, 'latest'> {
  /** The log that this tablet writes, and where it stands; null before its first line. */
  readonly own: string;
  readonly head: Head | null;
  readonly heads: readonly Head[];
  /** The latest time read of any other log. */
  readonly seen: string | null;
}

/** What a start reads: where the logs stand, the register, and the entries of open batches. Not history. */
export async function loadBench(store: LogStore, readRecipe: ReadRecipe, randomId: () => string): Promise<Loaded> {
  const [heads, ownRows, wideRows] = await Promise.all([
    store.heads(),
    store.derived(rowKeys.own),
    store.derived(rowKeys.wide),
  ]);
  const register = readRegister(valueOf(wideRows, rowKeys.wide), heads);
  const open = register && (await loadOpen(store, register, readRecipe));
  const { latest, ...found } = open ?? (await (await import('./rebuild-bench.ts')).rebuildBench(store, readRecipe));
  const own = (await ownLog(store, valueOf(ownRows, rowKeys.own), heads)) ?? randomId();
  const head = heads.find(({ log }) => log === own) ?? null;
  const others = heads.flatMap(({ log, time }) => (log === own ? [] : [time]));
  return { ...found, own, head, heads, seen: latestTime(latest === null ? others : [...others, latest]) };
}

const valueOf = (rows: readonly DerivedRow[], key: string): string | undefined =>
  rows.find((row) => row.key === key)?.value;

/** The log that this tablet writes; null where a new one begins, also where the old one lost its head. */
async function ownLog(store: LogStore, named: string | undefined, heads: readonly Head[]): Promise<string | null> {
  if (named === undefined || named === '') return null;
  if (heads.some(({ log }) => log === named)) return named;
  const [line] = await store.lines({ log: named, seq: 0 }, 1);
  return line?.log === named ? null : named;
}

/** Null where a row that the register names is missing or damaged, so that all must be read. */
async function loadOpen(store: LogStore, row: RegisterRow, readRecipe: ReadRecipe): Promise<Found | null> {
  const [recipes, open, unread] = await Promise.all([
    loadRecipes(store, row.recipes, readRecipe),
    Promise.all(row.open.map(async (id) => [id, readLines(await store.linesOfBatch(id), id)] as const)),
    Promise.all(row.unreadable.map((id) => stillUnreadable(store, id))),
  ]);
  // Lines that can be read by now are in no register.
  if (!recipes || unread.some(({ length }) => length === 0)) return null;
  const batches: Record<string, Batch> = {};
  const entries: Record<string, readonly Entry[]> = {};
  for (const [id, read] of open) {
    const { batch } = foldBatch(read.entries, recipes);
    if (!batch || batch.closed) return null;
    batches[id] = batch;
    entries[id] = read.entries;
  }
  const unreadable = [...open.flatMap(([, read]) => read.unreadable), ...unread.flat()];
  const wide = { ...emptyBenchWide, ...row.wide, recipes };
  return { bench: { wide, batches, entries }, unreadable, whole: false, latest: null };
}

async function stillUnreadable(store: LogStore, batch: string): Promise<Unreadable[]> {
  const { unreadable } = readLines(await store.linesOfBatch(batch), batch);
  // A row that lost its batch is found among all lines alone.
  if (batch === '' && unreadable.length === 0) {
    return [{ batch, text: '', problem: { kind: 'damaged', why: 'filed under no batch' } }];
  }
  return unreadable;
}

async function loadRecipes(
  store: LogStore,
  hashes: readonly string[],
  readRecipe: ReadRecipe,
): Promise<Record<string, TakenRecipe> | null> {
  const rows = new Map((await store.derived(rowKeys.recipes)).map(({ key, value }) => [key, value]));
  const recipes: Record<string, TakenRecipe> = {};
  for (const hash of hashes) {
    const text = rows.get(rowKeys.recipe(hash));
    const recipe = text !== undefined && sha256(text) === hash ? readRecipe(text) : null;
    if (!recipe) return null;
    recipes[hash] = { hash, recipe };
  }
  return recipes;
}
