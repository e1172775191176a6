import { expect, test } from 'vitest';
import { clearOlder, countMissing, type Stockroom } from '../../src/service-worker/stock.ts';

const roomOf = (kept: string[], quiet: () => boolean = () => true, onServer: string[] = []) => {
  const keys = new Set(kept);
  const room: Stockroom = {
    keys: () => Promise.resolve([...keys]),
    remove: (key) => Promise.resolve(keys.delete(key)),
    quiet: () => Promise.resolve(quiet()),
    fetch: (key) => (onServer.includes(key) ? Promise.resolve(keys.add(key)) : Promise.reject(new TypeError('404'))),
  };
  return { room, keys };
};

test('counts what is wanted and not kept', async () => {
  const { room } = roomOf(['a', 'b', 'old']);
  expect(await countMissing(room, ['a', 'b'])).toBe(0);
  const wanted = new Map([
    ['x', 'a'],
    ['y', 'c'],
    ['z', 'd'],
  ]);
  expect(await countMissing(room, wanted.values())).toBe(2);
});

test('a lost file is fetched again, but never one whose name could mean another version', async () => {
  const { room, keys } = roomOf(['a.1.js'], () => true, ['b.2.js', '/?revision=v1']);
  expect(await countMissing(room, ['a.1.js', 'b.2.js', 'c.3.js', '/?revision=v1'])).toBe(2);
  expect([...keys]).toEqual(['a.1.js', 'b.2.js']);
});

test('clears only what is not wanted', async () => {
  const { room, keys } = roomOf(['a', 'old', 'b', 'older']);
  await clearOlder(room, ['a', 'b']);
  expect([...keys]).toEqual(['a', 'b']);
});

test('clears nothing while another window or version may need it', async () => {
  const { room, keys } = roomOf(['a', 'old'], () => false);
  await clearOlder(room, ['a']);
  expect([...keys]).toEqual(['a', 'old']);
});

test('stops at once when another version begins to install', async () => {
  let asked = 0;
  const { room, keys } = roomOf(['old1', 'old2', 'old3'], () => (asked += 1) < 2);
  await clearOlder(room, []);
  expect([...keys]).toEqual(['old2', 'old3']);
});
