import { expect, test } from 'vitest';
import { fingerprint, precacheList } from '../../src/service-worker/precache-list.ts';

const lists = {
  base: '/lintfree',
  build: ['/lintfree/_app/immutable/a.1.js', '/lintfree/_app/immutable/f.2.woff', '/lintfree/_app/immutable/f.3.woff2'],
  files: ['/lintfree/icon.svg'],
  prerendered: [],
  version: 'v1',
};
const revisions = (from: typeof lists) => new Map(precacheList(from).map((entry) => [entry.url, entry.revision]));

test('the page, the named files and the hashed files, without the older font twins', () => {
  expect([...revisions(lists).keys()].sort()).toEqual([
    '/lintfree/',
    '/lintfree/_app/immutable/a.1.js',
    '/lintfree/_app/immutable/f.3.woff2',
    '/lintfree/icon.svg',
  ]);
  expect(revisions(lists).get('/lintfree/_app/immutable/a.1.js')).toBeNull();
});

test('the page is new whenever the version or one hashed file is', () => {
  const page = (from: typeof lists) => revisions(from).get('/lintfree/');
  const changed = { ...lists, build: ['/lintfree/_app/immutable/a.9.js'] };
  expect(page(lists)).toBe(page({ ...lists }));
  expect(new Set([page(lists), page(changed), page({ ...lists, version: 'v2' })]).size).toBe(3);
});

test('a page that stands in two lists is kept once', () => {
  const urls = precacheList({ ...lists, base: '', files: [], prerendered: ['/'] }).map((entry) => entry.url);
  expect(urls.filter((url) => url === '/')).toHaveLength(1);
});

// FNV-1a, 32 bits: test vectors of the Internet-Draft "The FNV Non-Cryptographic Hash Algorithm", from memory.
test.each([
  ['', '811c9dc5'],
  ['a', 'e40c292c'],
  ['foobar', 'bf9cf968'],
])('fingerprint of "%s"', (text, hash) => {
  expect(fingerprint(text)).toBe(hash);
});
