import fc from 'fast-check';
import { expect, test } from 'vitest';
import { latestTime, nextTime, nextTimeAfter, timePattern } from '../../../src/core/event/clock.ts';

const wallMs = fc.integer({ min: 0, max: 4_000_000_000_000 });
const nearWallMs = fc.integer({ min: 1_764_582_000_000, max: 1_764_582_000_020 });
const anyWallMs = fc.oneof(wallMs, nearWallMs);
const msOf = (time: string) => Number(time.slice(0, 13));

test('the first time is the wall clock', () => {
  expect(nextTime(null, 1_764_582_000_000)).toBe('1764582000000.00000');
});

test('a wall clock that stands or falls back raises the counter', () => {
  expect(nextTime('1764582000000.00000', 1_764_582_000_000)).toBe('1764582000000.00001');
  expect(nextTime('1764582000000.00001', 5)).toBe('1764582000000.00002');
});

test('a wall clock ahead starts the counter anew', () => {
  expect(nextTime('1764582000000.00007', 1_764_582_000_001)).toBe('1764582000001.00000');
});

test('a full counter carries into the next millisecond', () => {
  expect(nextTime('1764582000000.99999', 0)).toBe('1764582000001.00000');
});

test('what was seen of another log is passed', () => {
  expect(nextTimeAfter('1764582000000.00003', '1764582000900.00004', 1_764_582_000_000)).toBe('1764582000900.00005');
  expect(nextTimeAfter('1764582000900.00009', '1764582000900.00004', 0)).toBe('1764582000900.00010');
  expect(nextTimeAfter(null, '1764582000900.00004', 1_764_582_000_901)).toBe('1764582000901.00000');
});

test('a wall clock centuries ahead or before 1970 keeps the text at its length', () => {
  let time = nextTime(null, 1e15);
  for (let entry = 0; entry < 5; entry += 1) time = nextTime(time, 1e15);
  expect(time).toMatch(timePattern);
  expect(nextTime(null, -1)).toMatch(timePattern);
});

test('a text that is no time is refused by name', () => {
  expect(() => nextTime('1764582000000.1', 0)).toThrow('"1764582000000.1"');
});

test('law: times rise, are not before the wall clock, and stay within the highest one read', () => {
  fc.assert(
    fc.property(fc.array(fc.tuple(anyWallMs, fc.option(anyWallMs)), { minLength: 1, maxLength: 60 }), (events) => {
      let last: string | null = null;
      let highestMs = 0;
      for (const [wall, otherWall] of events) {
        const seen = otherWall === null ? null : nextTime(null, otherWall);
        const time = nextTimeAfter(last, seen, wall);
        highestMs = Math.max(highestMs, wall, otherWall ?? 0);
        expect(time).toMatch(timePattern);
        if (last !== null) expect(time > last).toBe(true);
        if (seen !== null) expect(time > seen).toBe(true);
        expect(msOf(time)).toBeGreaterThanOrEqual(wall);
        expect(msOf(time)).toBeLessThanOrEqual(highestMs);
        last = time;
      }
    }),
    { numRuns: 500 },
  );
});

test('law: the counter is bounded by the entries since the last change of ms', () => {
  fc.assert(
    fc.property(fc.array(nearWallMs, { minLength: 1, maxLength: 60 }), (walls) => {
      let last: string | null = null;
      walls.forEach((wall, before) => {
        last = nextTime(last, wall);
        expect(Number(last.slice(14))).toBeLessThanOrEqual(before);
      });
    }),
    { numRuns: 300 },
  );
});

test('the latest of several times', () => {
  expect(latestTime([])).toBeNull();
  expect(latestTime(['1764582000000.00001', '1764582000001.00000', '1764582000000.00009'])).toBe('1764582000001.00000');
});
