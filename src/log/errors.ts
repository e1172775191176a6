import type { Line } from '../core/event/entry.ts';

export type Doing = 'open' | 'read' | 'write' | 'remove';

/** What a store can fail with. */
export type StoreFault =
  /** A later version of the app wrote this database; this one leaves it alone. */
  | { readonly kind: 'newer' }
  /** Another window holds an earlier version open. */
  | { readonly kind: 'blocked' }
  /** The tablet has no room left. */
  | { readonly kind: 'full' }
  /** No answer within the time given. */
  | { readonly kind: 'silent'; readonly doing: Doing; readonly waitedMs: number }
  /** The connection or the transaction died; `name` is the browser's. */
  | { readonly kind: 'broken'; readonly doing: Doing; readonly name: string };

export class StoreError extends Error {
  readonly fault: StoreFault;
  constructor(fault: StoreFault, cause?: unknown) {
    super(faultText(fault), { cause });
    this.name = 'StoreError';
    this.fault = fault;
  }
}

/** These lines are not known to be saved. They are kept here so that they can be tried again or offered as a file. */
export class NotSavedError extends StoreError {
  readonly lines: readonly Line[];
  constructor(fault: StoreFault, lines: readonly Line[], cause?: unknown) {
    super(fault, cause);
    this.name = 'NotSavedError';
    this.lines = lines;
  }
}

/** A fault in words, for a terminal or a log; the page has words of its own. */
export function faultText(fault: StoreFault): string {
  switch (fault.kind) {
    case 'newer':
      return 'This database was written by a newer version. Update the app; nothing was changed.';
    case 'blocked':
      return 'Another window holds an older version of the database open. Close it.';
    case 'full':
      return 'The tablet has no room left for entries.';
    case 'silent':
      return `The database did not answer within ${fault.waitedMs / 1000} s (${fault.doing}).`;
    case 'broken':
      return `The connection to the database was lost (${fault.doing}, ${fault.name}).`;
  }
}

/** Makes whatever a store threw into a StoreError. A RangeError is a mistake of the caller and stays as it is. */
export function asStoreError(error: unknown, doing: Doing): StoreError | RangeError {
  if (error instanceof StoreError || error instanceof RangeError) return error;
  const name = error instanceof Error ? error.name : typeof error;
  if (name === 'VersionError') return new StoreError({ kind: 'newer' }, error);
  if (name === 'QuotaExceededError') return new StoreError({ kind: 'full' }, error);
  return new StoreError({ kind: 'broken', doing, name }, error);
}
