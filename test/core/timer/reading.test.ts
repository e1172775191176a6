import { describe, expect, test } from 'vitest';
import { readClock } from '../../../src/core/timer/reading.ts';
import type { Clock } from '../../../src/core/timer/clock.ts';
import { aim, atLeast, atMost, second } from './clock-like.ts';

const statesAt = (clock: Clock, ...seconds: number[]) => seconds.map((one) => readClock(clock, second(one)).state);

describe('the state of a clock', () => {
  test('at least: soon a minute before, done and waiting from its due moment, over past the longest dose', () => {
    expect(statesAt(atLeast(1200, 3600), 0, 1139, 1140, 1199.999, 1200, 3599, 3600)).toEqual([
      'running',
      'running',
      'soon',
      'soon',
      'done',
      'done',
      'over',
    ]);
  });

  test('at least, short: soon for no more than its second half', () => {
    expect(statesAt(atLeast(60), 29, 30)).toEqual(['running', 'soon']);
  });

  test('at most: soon for its last tenth, but at least 5 min; over at its end', () => {
    expect(statesAt(atMost(3600), 3239, 3240, 3599, 3600)).toEqual(['running', 'soon', 'soon', 'over']);
    expect(statesAt(atMost(1200), 899, 900)).toEqual(['running', 'soon']);
    expect(statesAt(atMost(480), 239, 240)).toEqual(['running', 'soon']);
  });

  test('aim: done within its tolerance, ends included, over past it', () => {
    expect(statesAt(aim(60, 5), 44, 45, 54.9, 55, 60, 65, 65.001)).toEqual([
      'running',
      'soon',
      'soon',
      'done',
      'done',
      'done',
      'over',
    ]);
  });

  test('that nothing makes due runs without an end', () => {
    const reading = readClock(atLeast(null), second(86_400));
    expect(reading).toMatchObject({ state: 'running', leftMs: Infinity, leftToOverMs: Infinity, share: 0 });
  });
});

test('time left is negative once it is past, the share stays between nought and one', () => {
  expect(readClock(atLeast(1200, 3600), second(300))).toMatchObject({
    leftMs: 900_000,
    leftToOverMs: 3_300_000,
    share: 0.25,
  });
  expect(readClock(atLeast(1200), second(1500))).toMatchObject({ leftMs: -300_000, share: 1 });
  expect(readClock(atLeast(1200), second(-30))).toMatchObject({ share: 0 });
});

describe('read by another tablet', () => {
  test('it rests on wall clocks and says so', () => {
    const now = { log: 'tablet-b', bench: 5, wall: second(900).wall };
    expect(readClock(atLeast(1200), now)).toMatchObject({ leftMs: 300_000, uncertain: true });
    expect(readClock(atLeast(1200), second(900)).uncertain).toBe(false);
  });

  test('a wall clock behind the start counts nothing', () => {
    const now = { log: 'tablet-b', bench: 5, wall: second(-900).wall };
    expect(readClock(atLeast(1200), now).leftMs).toBe(1_200_000);
  });
});
