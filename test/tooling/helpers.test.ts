import { expect, test } from 'vitest';
import { misses, table } from '../../.ci/lib/bench-table.mjs';
import { importTypescript } from '../../.ci/lib/import-typescript.mjs';
import { agrees } from '../../.ci/lib/install.mjs';
import { refuseOldNode } from '../../.ci/lib/node-version.mjs';

test.each(['18.20.4', '20.18.9', '20.0.0'])('Node %s is refused in words', (version) => {
  expect(() => refuseOldNode(version)).toThrow(`Lintfree needs Node 20.19 or newer; this is Node ${version}.`);
});

test.each(['20.19.0', '20.20.2', '22.0.0', '24.1.0'])('Node %s is let through', (version) => {
  expect(() => refuseOldNode(version)).not.toThrow();
});

test('installed packages agree with the lock, but for those of other machines', () => {
  const lock = {
    packages: {
      '': {},
      'node_modules/a': { version: '1.0.0' },
      'node_modules/b': { version: '2.0.0', optional: true },
    },
  };
  expect(agrees(lock, { packages: { 'node_modules/a': { version: '1.0.0' } } })).toBe(true);
  expect(agrees(lock, { packages: { 'node_modules/a': { version: '1.0.1' } } })).toBe(false);
  expect(agrees(lock, { packages: { 'node_modules/b': { version: '2.0.0' } } })).toBe(false);
});

test('a TypeScript module runs in Node', async () => {
  const schema: { cautions: readonly string[] } = await importTypescript('src/core/recipe/schema.ts');
  expect(schema.cautions).toContain('bare glass');
});

test('the table of measurements marks what misses its aim', () => {
  const met = { what: 'fold', value: 90, unit: 'ms', floor: 100, ratio: 0.9, aim: 1 };
  const missed = { ...met, what: 'first load', ratio: 3.2, aim: 3, note: 'fonts told apart' };
  const bare = { what: 'fonts', value: 41200, unit: 'B', floor: null, ratio: null, aim: null };
  expect([met, missed, bare].map(misses)).toEqual([false, true, false]);
  const lines = table([met, missed, bare]).split('\n');
  expect(lines[1]).toMatch(/^fold +90 +ms +100 +0\.900 +1 +met$/);
  expect(lines[2]).toMatch(/missed +fonts told apart$/);
  expect(lines[3]).toMatch(/^fonts +41200 +B +- +- +-$/);
});
