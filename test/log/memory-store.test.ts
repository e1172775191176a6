import { describe, test } from 'vitest';
import { emptyMemory, memoryKey, memoryStore } from '../../src/log/memory-store.ts';
import { steadyStore } from '../../src/log/steady-store.ts';
import { logStoreContract, type StorePlace } from '../contract/log-store.ts';
import { fakeClock } from '../fake/clock.ts';

function memoryPlace(): Promise<StorePlace> {
  const memory = emptyMemory();
  return Promise.resolve({
    open: () => Promise.resolve(memoryStore(memory)),
    plant: (kind, row) => {
      const { log, seq, key } = row as { log: string; seq: number; key: string };
      memory[kind].set({ lines: memoryKey({ log, seq }), heads: log, derived: key }[kind], row);
      return Promise.resolve();
    },
  });
}

describe('contract: memory store', () => {
  logStoreContract({ test }, memoryPlace);
});

describe('contract: steady store over a memory store', () => {
  logStoreContract({ test }, async () => {
    const place = await memoryPlace();
    return { ...place, open: () => Promise.resolve(steadyStore(() => place.open(), { after: fakeClock().after })) };
  });
});
