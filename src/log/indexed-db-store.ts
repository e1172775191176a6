import type { IDBPTransaction } from 'idb';
import type { EntryId, Head, Line } from '../core/event/entry.ts';
import { checkAppend, standsAt } from './append-rule.ts';
import { openDatabase, type LogDatabase, type LogSchema } from './database.ts';
import { asStoreError, type Doing } from './errors.ts';
import { readAll, readDerivedRow, readHeadRow, readLineRow, readLineText } from './rows.ts';
import type { Appended, Derived, Gone, LogStore } from './store.ts';

type Writing<Stores extends ('lines' | 'heads' | 'derived')[]> = IDBPTransaction<LogSchema, Stores, 'readwrite'>;

/** Opens the store in the browser's database of that name. Rejects with a StoreError. */
export async function openIndexedDbStore(name: string, gone: (why: Gone) => void): Promise<LogStore> {
  return indexedDbStore(await openDatabase(name, gone));
}

function indexedDbStore(database: LogDatabase): LogStore {
  return {
    heads: () => told('read', async () => readAll(await database.getAll('heads'), readHeadRow)),
    append: (expected, lines, head, derived) => told('write', () => append(database, expected, lines, head, derived)),
    linesOfBatch: (batch) =>
      told('read', async () => (await database.getAllFromIndex('lines', 'batch', batch)).map(readLineText)),
    lines: (after, most) =>
      told('read', async () => readAll(await database.getAll('lines', rangeAfter(after), most), readLineRow)),
    derived: (prefix) => told('read', () => derivedIn(database, IDBKeyRange.bound(prefix, `${prefix}\uffff`))),
    derivedBetween: (fromKey, toKey) =>
      told('read', async () =>
        fromKey < toKey ? derivedIn(database, IDBKeyRange.bound(fromKey, toKey, false, true)) : [],
      ),
    putDerived: (rows) =>
      told('write', async () => {
        const transaction = database.transaction(['derived'], 'readwrite');
        await completed(transaction.done, putRows(transaction, rows));
      }),
    count: () => told('read', () => database.count('lines')),
    close: () => database.close(),
  };
}

async function append(
  database: LogDatabase,
  expected: Head | null,
  lines: readonly Line[],
  head: Head,
  derived: readonly Derived[],
): Promise<Appended> {
  checkAppend(expected, lines, head);
  // Strict: "complete" comes after the flush to the disk, not before it.
  const transaction = database.transaction(['lines', 'heads', 'derived'], 'readwrite', { durability: 'strict' });
  // Where a request fails first, that one tells.
  transaction.done.catch(() => {});
  const kept = transaction.objectStore('lines');
  const stored = readHeadRow(await transaction.objectStore('heads').get(head.log));
  if (!standsAt(expected, stored)) {
    const rows = await Promise.all(lines.map((line) => kept.get([line.log, line.seq])));
    return rows.every((row, index) => readLineText(row) === lines[index]?.text) ? 'saved' : 'moved';
  }
  const requests = [
    ...lines.map((line) => kept.add(line)),
    transaction.objectStore('heads').put(head),
    ...putRows(transaction, derived),
  ];
  // Asked for rather than waited for: the browser need not first come back with each answer.
  transaction.commit();
  await completed(transaction.done, requests);
  return 'saved';
}

function putRows(
  transaction: Writing<['derived']> | Writing<['lines', 'heads', 'derived']>,
  rows: readonly Derived[],
): Promise<unknown>[] {
  const store = (transaction as Writing<['derived']>).objectStore('derived');
  return rows.map((row) => ('remove' in row ? store.delete(row.key) : store.put(row)));
}

/**
 * Resolves when the transaction is complete. Of several failures the telling one is thrown: a request of a transaction
 * that was aborted for lack of room says only "AbortError".
 */
async function completed(done: Promise<void>, requests: readonly Promise<unknown>[]): Promise<void> {
  const outcomes = await Promise.allSettled([...requests, done]);
  const reasons = outcomes.flatMap((outcome) => (outcome.status === 'rejected' ? [outcome.reason as unknown] : []));
  if (reasons.length === 0) return;
  throw reasons.find((reason) => !(reason instanceof DOMException && reason.name === 'AbortError')) ?? reasons[0];
}

async function derivedIn(database: LogDatabase, range: IDBKeyRange) {
  return readAll(await database.getAll('derived', range), readDerivedRow);
}

function rangeAfter(after: EntryId | undefined): IDBKeyRange | undefined {
  return after === undefined ? undefined : IDBKeyRange.lowerBound([after.log, after.seq], true);
}

async function told<Value>(doing: Doing, run: () => Promise<Value>): Promise<Value> {
  try {
    return await run();
  } catch (error) {
    throw asStoreError(error, doing);
  }
}
