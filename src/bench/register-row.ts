import { foldVersion, registerOf, type Register } from '../core/batch/register.ts';
import type { Bench } from '../core/batch/types.ts';
import type { Head } from '../core/event/entry.ts';
import { sha256 } from '../core/event/hash.ts';
import type { Moment } from '../core/unit/moment.ts';

/** What a start needs besides the lines of open batches. */
export interface RegisterRow {
  readonly fold: number;
  /** The hash of each log's last line: a register that stands elsewhere is made anew. */
  readonly heads: Readonly<Record<string, string>>;
  readonly wide: Register;
  /** Ids of open batches. */
  readonly open: readonly string[];
  /** Hashes of the recipes in use, each of which has a row of its own. */
  readonly recipes: readonly string[];
  /** Where lines stand that cannot be read: ids of batches that are not open, or "bench". */
  readonly unreadable: readonly string[];
}

export function registerRow(
  bench: Bench,
  heads: readonly Head[],
  unreadable: readonly { readonly batch: string }[],
  now: Moment,
): RegisterRow {
  const open = Object.values(bench.batches).filter((batch) => !batch.closed);
  const ids = open.map(({ id }) => id);
  return {
    fold: foldVersion,
    heads: Object.fromEntries(heads.map(({ log, hash }) => [log, hash])),
    wide: registerOf(
      bench.wide,
      open.map((batch) => ({ batch, entries: bench.entries[batch.id] ?? [] })),
      now,
    ),
    open: ids,
    recipes: Object.keys(bench.wide.recipes),
    unreadable: [...new Set(unreadable.map(({ batch }) => batch))].filter((id) => !ids.includes(id)),
  };
}

/** A row's text begins with the hash of the rest: what is read back is what was written, or is made anew. */
export function registerText(row: RegisterRow): string {
  const text = JSON.stringify(row);
  return `${sha256(text)} ${text}`;
}

const hashLength = 64;

/** Null where the row is damaged, of another version of the fold, or where a log has gone on without it. */
export function readRegister(stored: string | undefined, heads: readonly Head[]): RegisterRow | null {
  const text = stored?.slice(hashLength + 1);
  if (text === undefined || stored !== `${sha256(text)} ${text}`) return null;
  const row = JSON.parse(text) as RegisterRow;
  const current =
    Object.keys(row.heads).length === heads.length && heads.every(({ log, hash }) => row.heads[log] === hash);
  return row.fold === foldVersion && current ? row : null;
}
