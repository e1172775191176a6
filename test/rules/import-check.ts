import { builtinModules } from 'node:module';
import { posix } from 'node:path';
import type { ImportTable } from './import-table.ts';
import { importsOf } from './imports-of.ts';

export interface SourceFile {
  readonly path: string;
  readonly text: string;
}

/** The room that a path belongs to: `core/unit`, `ui`, `src` for a file right in src, else the folder beside src. */
export function roomOf(path: string): string {
  const [top = '', second = '', third = '', fourth] = path.split('/');
  if (top !== 'src') return top;
  if (third === '') return 'src';
  return second === 'core' && fourth !== undefined ? `core/${third}` : second;
}

function packageProblem(specifier: string, allowed: readonly string[]): string | null {
  if (specifier.startsWith('$lib')) return 'imports inside src are relative';
  const isNode = specifier.startsWith('node:') || builtinModules.includes(specifier);
  const fits = allowed.some((name) =>
    isNode ? name === 'node' : specifier === name || specifier.startsWith(`${name}/`),
  );
  return fits ? null : `this room may use ${allowed.join(', ') || 'no package'}`;
}

function pathProblem(
  from: string,
  specifier: string,
  allowed: readonly string[],
  exists: (path: string) => boolean,
): string | null {
  const path = posix.join(posix.dirname(from), specifier.replace(/\?.*$/, ''));
  const own = roomOf(from);
  const room = roomOf(path);
  if (room !== own && !allowed.includes(room)) return `${own} may import ${allowed.join(', ') || 'no other room'}`;
  // SvelteKit makes the types of a route; they stand in no folder of ours.
  if (own === 'routes' && /^\.\/\$types(\.d\.ts|\.js)?$/.test(specifier)) return null;
  if (path.includes('*')) return null;
  return exists(path) ? null : 'there is no such file: the ending is written out';
}

/** Every import that the table does not allow, as sentences. */
export function importProblems(
  table: ImportTable,
  files: readonly SourceFile[],
  exists: (path: string) => boolean,
): string[] {
  return files.flatMap(({ path, text }) => {
    const room = roomOf(path);
    const allowance = table.get(room);
    if (allowance === undefined) return [`${path}: the room "${room}" has no row in DEVELOPERS.md`];
    return importsOf(path, text).flatMap((specifier) => {
      if (specifier === null) return [`${path}: an import whose name is only known when it runs cannot be checked`];
      const relative = /^\.{1,2}\//.test(specifier);
      const problem = relative
        ? pathProblem(path, specifier, allowance.rooms, exists)
        : packageProblem(specifier, allowance.packages);
      return problem === null ? [] : [`${path}: ${specifier}: ${problem}`];
    });
  });
}
