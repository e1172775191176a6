import type { EntryId, Head, Line } from '../core/event/entry.ts';
import { checkAppend, standsAt } from './append-rule.ts';
import { StoreError } from './errors.ts';
import { readAll, readDerivedRow, readHeadRow, readLineRow, readLineText } from './rows.ts';
import type { Derived, LogStore } from './store.ts';

/** What several memory stores may share, as several windows share a database. Rows are as good as stored ones. */
export interface Memory {
  readonly lines: Map<string, unknown>;
  readonly heads: Map<string, unknown>;
  readonly derived: Map<string, unknown>;
}

export const emptyMemory = (): Memory => ({ lines: new Map(), heads: new Map(), derived: new Map() });

export const memoryKey = ({ log, seq }: EntryId): string => `${log}\u0000${seq}`;

const compareText = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);
const compareIds = (a: EntryId, b: EntryId): number => compareText(a.log, b.log) || a.seq - b.seq;

/** A store that lives as long as the page: for tests, for the command line, for a browser without a database. */
export function memoryStore(memory: Memory = emptyMemory()): LogStore {
  let open = true;
  const whileOpen = <Value>(run: () => Value): Promise<Value> =>
    new Promise((resolve) => {
      if (!open) throw new StoreError({ kind: 'broken', doing: 'read', name: 'closed' });
      resolve(run());
    });

  function writeDerived(rows: readonly Derived[]): void {
    for (const row of rows) {
      if ('remove' in row) memory.derived.delete(row.key);
      else memory.derived.set(row.key, { ...row });
    }
  }

  const derivedWhere = (holds: (key: string) => boolean) =>
    readAll([...memory.derived.values()], readDerivedRow)
      .filter((row) => holds(row.key))
      .sort((a, b) => compareText(a.key, b.key));

  const allLines = (): Line[] => readAll([...memory.lines.values()], readLineRow).sort(compareIds);

  return {
    heads: () => whileOpen(() => readAll([...memory.heads.values()], readHeadRow)),
    append: (expected, lines, head, derived) =>
      whileOpen(() => {
        checkAppend(expected, lines, head);
        if (!standsAt(expected, readHeadRow(memory.heads.get(head.log)))) {
          const there = lines.every((line) => readLineText(memory.lines.get(memoryKey(line))) === line.text);
          return there ? 'saved' : 'moved';
        }
        const taken = lines.some((line) => memory.lines.has(memoryKey(line)));
        if (taken) throw new StoreError({ kind: 'broken', doing: 'write', name: 'ConstraintError' });
        for (const line of lines) memory.lines.set(memoryKey(line), { ...line });
        memory.heads.set(head.log, { ...head } satisfies Head);
        writeDerived(derived);
        return 'saved';
      }),
    linesOfBatch: (batch) => whileOpen(() => allLines().flatMap((line) => (line.batch === batch ? [line.text] : []))),
    lines: (after, most) =>
      whileOpen(() =>
        allLines()
          .filter((line) => after === undefined || compareIds(line, after) > 0)
          .slice(0, most),
      ),
    derived: (prefix) => whileOpen(() => derivedWhere((key) => key.startsWith(prefix))),
    derivedBetween: (fromKey, toKey) => whileOpen(() => derivedWhere((key) => key >= fromKey && key < toKey)),
    putDerived: (rows) => whileOpen(() => writeDerived(rows)),
    count: () => whileOpen(() => memory.lines.size),
    close: () => {
      open = false;
    },
  };
}
