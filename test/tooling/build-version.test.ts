import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { versionOfSources } from '../../.ci/lib/build.mjs';

const checkout = mkdtempSync(join(tmpdir(), 'lintfree-version-'));
afterAll(() => rmSync(checkout, { recursive: true, force: true }));

const write = (path: string, text: string) => {
  mkdirSync(dirname(join(checkout, path)), { recursive: true });
  writeFileSync(join(checkout, path), text);
};
const version = (base = '') => versionOfSources(base, checkout);

write('src/routes/+page.svelte', '<h1>Bench</h1>');
write('static/icon.svg', '<svg/>');
write('test/a.test.ts', '');

test('the same sources have the same version', () => {
  expect(version()).toMatch(/^[0-9a-f]{16}$/);
  expect(version()).toBe(version());
});

test('a file changed in static alone is a new version, so the service worker changes too', () => {
  const before = version();
  write('static/icon.svg', '<svg />');
  expect(version()).not.toBe(before);
});

test('a moved file, a recipe, the lock and the base path are part of it; a test is not', () => {
  const seen = [version(), version('/lintfree')];
  renameSync(join(checkout, 'static/icon.svg'), join(checkout, 'static/mark.svg'));
  seen.push(version());
  write('recipes/r1.json', '{}');
  seen.push(version());
  write('package-lock.json', '{}');
  seen.push(version());
  expect(new Set(seen).size).toBe(seen.length);
  write('test/a.test.ts', '// changed');
  expect(version()).toBe(seen.at(-1));
});
