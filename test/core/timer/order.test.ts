import { describe, expect, test } from 'vitest';
import { attention, byAttention, compareAttention } from '../../../src/core/timer/order.ts';
import { readClock, type Reading } from '../../../src/core/timer/reading.ts';
import { aim, atLeast, atMost, second } from './clock-like.ts';

const now = second(1000);
const rows: Record<string, { readings: Reading[]; handsFree: boolean }> = {
  'working life over for 400 s': { readings: [readClock(atMost(600), now)], handsFree: true },
  'cure over for 100 s': { readings: [readClock(atLeast(300, 900), now)], handsFree: false },
  'film with 30 s left': { readings: [readClock(aim(1030, 5), now)], handsFree: false },
  'working life with 200 s left': { readings: [readClock(atMost(1200), now)], handsFree: true },
  'cure done for 300 s': { readings: [readClock(atLeast(700, 9000), now)], handsFree: false },
  'waits for hands': { readings: [], handsFree: true },
  'cure with 50 s left': { readings: [readClock(atLeast(1050), now)], handsFree: false },
  'cure with 500 s left': { readings: [readClock(atLeast(1500), now)], handsFree: false },
  nothing: { readings: [], handsFree: false },
};

describe('order on the bench', () => {
  test('over, what must not be missed, what waits for hands, what runs by itself', () => {
    const names = Object.keys(rows);
    const keyed = [...names].reverse().map((name) => {
      const row = rows[name];
      return { name, key: attention(row?.readings ?? [], row?.handsFree ?? false) };
    });
    keyed.sort((a, b) => compareAttention(a.key, b.key));
    expect(keyed.map(({ name }) => name)).toEqual(names);
  });

  test('a row is as urgent as the most urgent thing in it', () => {
    const both = [readClock(atLeast(1500), now), readClock(atMost(1200), now)];
    expect(attention(both, true)).toEqual({ rank: 'must not be missed', leftMs: 200_000 });
  });

  test('a cure that nothing makes due waits for a person', () => {
    expect(attention([readClock(atLeast(null), now)], false)).toEqual({ rank: 'waits for hands', leftMs: 0 });
  });

  test('two rows that ask for nothing are equal', () => {
    expect(compareAttention(attention([], false), attention([], false))).toBe(0);
  });
});

test('clocks that are equally urgent keep the order of their ids', () => {
  const one = { ...atLeast(1500), id: 'cure:a' };
  const other = { ...atLeast(1500), id: 'cure:b' };
  const ids = (list: Reading[]) => byAttention(list).map(({ clock }) => clock.id);
  const readings = [readClock(other, now), readClock(one, now), readClock(atMost(1100), now)];
  expect(ids(readings)).toEqual(['life:m1:b1', 'cure:a', 'cure:b']);
  expect(ids([...readings].reverse())).toEqual(['life:m1:b1', 'cure:a', 'cure:b']);
});
