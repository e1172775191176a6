import { describe, expect, test } from 'vitest';
import { inlineCode, tableBelow } from './markdown.ts';
import { read } from './project-files.ts';

type Versions = Record<string, string>;
const manifest = JSON.parse(read('package.json')) as { dependencies: Versions; devDependencies: Versions };

const rowsBelow = (heading: string) =>
  tableBelow(read('DEVELOPERS.md'), heading).map(([name = '', why = '', instead = '']) => ({
    name: inlineCode(name)[0] ?? '',
    why,
    instead,
  }));

describe('every dependency is accounted for in DEVELOPERS.md', () => {
  test.each([
    ['Dependencies', manifest.dependencies],
    ['Development dependencies', manifest.devDependencies],
  ])('%s: one row each, with a reason and what was not taken', (heading, versions) => {
    const rows = rowsBelow(heading);
    expect(rows.map((row) => row.name).sort()).toEqual(Object.keys(versions).sort());
    expect(rows.filter((row) => row.why.length < 12 || row.instead.length < 3)).toEqual([]);
  });

  test('versions are exact', () => {
    const all = Object.entries({ ...manifest.dependencies, ...manifest.devDependencies });
    expect(all.filter(([, version]) => !/^\d+\.\d+\.\d+$/.test(version))).toEqual([]);
  });

  test('the lock names no place of download, so that any mirror serves', () => {
    expect(read('package-lock.json')).not.toContain('"resolved"');
  });
});
