import { expect, test } from 'vitest';
import { showDayAt } from '../../src/bench/show-day.ts';
import { shifted } from '../../src/core/unit/moment.ts';

const now = { log: 'a', bench: 0, wall: Date.UTC(2026, 2, 3, 8, 30) };

test('a time of day alone for what is near, with its date for what is far', () => {
  const show = showDayAt(now, 60);
  expect(show(shifted(now, -11 * 3_600_000))).toBe('22:30');
  expect(show(shifted(now, -12 * 3_600_000))).toBe('21:30, 2026-03-02');
  expect(show(shifted(now, 3_600_000))).toBe('10:30');
});
