import type { EntryId, Head, Line } from '../core/event/entry.ts';

/** A row that is reckoned from entries and can be reckoned again: written, or taken away. */
export type Derived =
  { readonly key: string; readonly value: string } | { readonly key: string; readonly remove: true };

export interface DerivedRow {
  readonly key: string;
  readonly value: string;
}

/** `moved`: the log has gone on since; nothing was written. Fold the news and decide again. */
export type Appended = 'saved' | 'moved';

/**
 * Keeps the lines of all logs. Every method rejects with a StoreError where the store does not answer or refuses.
 * Texts come back as they were written, never checked: a damaged one is found by parsing it.
 */
export interface LogStore {
  /** Of each log that can be continued. */
  heads(): Promise<Head[]>;
  /**
   * Writes all lines, the head after them and the derived rows, or nothing. `expected` is the head that the lines were
   * made after. Resolves once they are on the disk. The same lines already there count as saved.
   */
  append(expected: Head | null, lines: readonly Line[], head: Head, derived: readonly Derived[]): Promise<Appended>;
  /** Texts of one batch from all logs, in any order. */
  linesOfBatch(batch: string): Promise<string[]>;
  /** Lines by log, then seq, beginning after `after`, at most `most` of them; a shorter answer is the last. */
  lines(after?: EntryId, most?: number): Promise<Line[]>;
  /** Rows whose key begins so, by key. */
  derived(prefix: string): Promise<DerivedRow[]>;
  /** Rows with fromKey <= key < toKey, by key. */
  derivedBetween(fromKey: string, toKey: string): Promise<DerivedRow[]>;
  /** Writes rows that were reckoned again; entries are not touched. */
  putDerived(rows: readonly Derived[]): Promise<void>;
  /** How many lines of all logs. */
  count(): Promise<number>;
  close(): void;
}

/** Why a store was closed from outside: the browser lost it, or another window opens a newer version, or removes it. */
export type Gone = 'terminated' | 'newer version' | 'removed';

/** Opens a store; `gone` is called when it is closed from outside. */
export type OpenStore = (gone: (why: Gone) => void) => Promise<LogStore>;
