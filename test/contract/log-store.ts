import type { Gone, LogStore } from '../../src/log/store.ts';
import type { Runner } from './expect.ts';
import { appendContract } from './log-store-append.ts';
import { damageContract } from './log-store-damage.ts';
import { readContract } from './log-store-read.ts';

/** One empty place to keep logs in, that can be opened again and again, also several times at once. */
export interface StorePlace {
  open(gone?: (why: Gone) => void): Promise<LogStore>;
  /** Puts a row there past the store's own door. */
  plant(kind: 'lines' | 'heads' | 'derived', row: object): Promise<void>;
}

export type MakePlace = () => Promise<StorePlace>;

/** What every store of logs must do. Each test takes a place of its own. */
export function logStoreContract(runner: Runner, makePlace: MakePlace): void {
  appendContract(runner, makePlace);
  readContract(runner, makePlace);
  damageContract(runner, makePlace);
}
