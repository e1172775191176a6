import { deleteDB, openDB, type DBSchema, type IDBPDatabase } from 'idb';
import type { Head, Line } from '../core/event/entry.ts';
import { asStoreError, StoreError } from './errors.ts';
import type { DerivedRow, Gone } from './store.ts';

/** Rows as they are written. What is read back is checked all the same. */
export interface LogSchema extends DBSchema {
  lines: { key: [string, number]; value: Line; indexes: { batch: string } };
  heads: { key: string; value: Head };
  derived: { key: string; value: DerivedRow };
}

export type LogDatabase = IDBPDatabase<LogSchema>;

/** Rises with every change of the stores; each step upwards stands in `upgrade`. */
export const databaseVersion = 1;

function upgrade(database: LogDatabase, from: number): void {
  if (from < 1) {
    database.createObjectStore('lines', { keyPath: ['log', 'seq'] }).createIndex('batch', 'batch');
    database.createObjectStore('heads', { keyPath: 'log' });
    database.createObjectStore('derived', { keyPath: 'key' });
  }
}

/**
 * Opens the database of that name, made where there is none. Refuses one of a newer version, and one that another window
 * holds in an older version. When another window wants a newer version, or the database removed, this connection is
 * closed at once.
 */
export function openDatabase(
  name: string,
  gone: (why: Gone) => void,
  version: number = databaseVersion,
): Promise<LogDatabase> {
  return new Promise((resolve, reject) => {
    let refused = false;
    openDB<LogSchema>(name, version, {
      upgrade,
      blocked: () => {
        refused = true;
        reject(new StoreError({ kind: 'blocked' }));
      },
      blocking: (_current, wanted, event) => {
        (event.target as IDBDatabase).close();
        gone(wanted === null ? 'removed' : 'newer version');
      },
      terminated: () => gone('terminated'),
    }).then(
      // A connection that comes after its refusal would block the next opening.
      (database) => (refused ? database.close() : resolve(database)),
      (error: unknown) => reject(asStoreError(error, 'open')),
    );
  });
}

/**
 * Removes a database with all that is in it. Rejects as `blocked` where another window does not let go of it; it is then
 * removed as soon as that window closes.
 */
export function removeDatabase(name: string): Promise<void> {
  return new Promise((resolve, reject) => {
    deleteDB(name, { blocked: () => reject(new StoreError({ kind: 'blocked' })) }).then(resolve, (error: unknown) =>
      reject(asStoreError(error, 'remove')),
    );
  });
}
