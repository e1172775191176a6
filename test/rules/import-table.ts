import { inlineCode, tableBelow } from './markdown.ts';

export interface Allowance {
  /** Rooms of `src` and folders beside it. */
  readonly rooms: readonly string[];
  /** Packages, or a package's entry such as "zod/mini", which does not stand for the rest of the package. */
  readonly packages: readonly string[];
}

export type ImportTable = ReadonlyMap<string, Allowance>;

const heading = 'Who may import whom';

/** Reads the table out of DEVELOPERS.md. `core` there stands for every room of core. */
export function parseImportTable(markdown: string): ImportTable {
  const rows = tableBelow(markdown, heading).map(([room = '', rooms = '', packages = '']) => ({
    names: inlineCode(room),
    rooms: inlineCode(rooms),
    packages: inlineCode(packages),
  }));
  const all = rows.flatMap((row) => row.names);
  const core = all.filter((name) => name.startsWith('core/'));
  const table = new Map<string, Allowance>();
  for (const row of rows) {
    if (row.names.length === 0) throw new Error(`A row of "${heading}" names no room.`);
    const rooms = row.rooms.flatMap((name) => (name === 'core' ? core : [name]));
    for (const name of row.names) {
      if (table.has(name)) throw new Error(`${name} has two rows in "${heading}".`);
      table.set(name, { rooms, packages: row.packages });
    }
  }
  return table;
}
