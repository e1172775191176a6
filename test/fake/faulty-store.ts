import type { LogStore, OpenStore } from '../../src/log/store.ts';

/**
 * What goes wrong at one use of a store. "lost" writes nothing, "unheard" writes and the answer gets lost; either fails
 * at once with the browser's error of that name, or never answers.
 */
export type Fault =
  | { readonly what: 'lost'; readonly name: string }
  | { readonly what: 'unheard'; readonly name: string }
  | { readonly what: 'lost, silent' }
  | { readonly what: 'unheard, silent' };

const never = new Promise<never>(() => {});

async function suffer<Value>(fault: Fault | null, run: () => Promise<Value>): Promise<Value> {
  if (fault === null) return run();
  if (fault.what === 'unheard' || fault.what === 'unheard, silent') await run();
  if (fault.what === 'lost' || fault.what === 'unheard') throw new DOMException('planned by a test', fault.name);
  return never;
}

/** An opener whose uses fail as planned: the first use takes the first of the list, null works, and so does the end. */
export function faultyOpener(open: OpenStore, faults: readonly (Fault | null)[], ofOpening: typeof faults = []) {
  const planned = [...faults];
  const plannedOpenings = [...ofOpening];
  const opened: { closed: boolean; gone: Parameters<OpenStore>[0] }[] = [];
  const suffering: OpenStore = (gone) =>
    suffer(plannedOpenings.shift() ?? null, async () => {
      const store = await open(gone);
      const record = { closed: false, gone };
      opened.push(record);
      return proxied(store, () => planned.shift() ?? null, record);
    });
  return { open: suffering, opened };
}

function proxied(store: LogStore, nextFault: () => Fault | null, record: { closed: boolean }): LogStore {
  return {
    heads: () => suffer(nextFault(), () => store.heads()),
    append: (...asked) => suffer(nextFault(), () => store.append(...asked)),
    linesOfBatch: (batch) => suffer(nextFault(), () => store.linesOfBatch(batch)),
    lines: (after, most) => suffer(nextFault(), () => store.lines(after, most)),
    derived: (prefix) => suffer(nextFault(), () => store.derived(prefix)),
    derivedBetween: (fromKey, toKey) => suffer(nextFault(), () => store.derivedBetween(fromKey, toKey)),
    putDerived: (rows) => suffer(nextFault(), () => store.putDerived(rows)),
    count: () => suffer(nextFault(), () => store.count()),
    close: () => {
      record.closed = true;
      store.close();
    },
  };
}
