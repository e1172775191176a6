import { openDatabase } from '../../../src/log/database.ts';
import { openIndexedDbStore } from '../../../src/log/indexed-db-store.ts';
import type { Runner } from '../../contract/expect.ts';
import { logStoreContract, type StorePlace } from '../../contract/log-store.ts';
import { browserTests } from './browser-tests.ts';

export * from './windows.ts';

export interface Outcome {
  readonly name: string;
  /** Null where the test passed. */
  readonly error: string | null;
}

let places = 0;

function makePlace(): Promise<StorePlace> {
  places += 1;
  const name = `contract-${places}`;
  return Promise.resolve({
    open: (gone = () => {}) => openIndexedDbStore(name, gone),
    plant: async (kind, row) => {
      const database = await openDatabase(name, () => {});
      await database.put(kind, row as never);
      database.close();
    },
  });
}

async function outcomesOf(suite: (runner: Runner) => void): Promise<Outcome[]> {
  const tests: Parameters<Runner['test']>[] = [];
  suite({ test: (...test) => void tests.push(test) });
  const outcomes: Outcome[] = [];
  for (const [name, run] of tests) {
    const error = await run().then(
      () => null,
      (reason: unknown) => String(reason),
    );
    outcomes.push({ name, error });
  }
  return outcomes;
}

export const suites = {
  indexedDb: () => outcomesOf((runner) => logStoreContract(runner, makePlace)),
  browser: () => outcomesOf(browserTests),
};
