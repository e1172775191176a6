import fc from 'fast-check';
import { expect, test } from 'vitest';
import { compareClocks, type Rest } from '../../src/device/compare-clocks.ts';

const jump = (wallMs: number, monoMs: number, rest: Rest = 'awake') =>
  compareClocks({ wall: 1000, mono: 500 }, { wall: 1000 + wallMs, mono: 500 + monoMs }, rest);

test.each([
  ['an ordinary tick', 250, 250, 'awake', null],
  ['a slow tick', 5000, 5000, 'awake', null],
  ['a gap over 5 s', 5001, 5001, 'awake', 'tabletWoke'],
  ['a sleep in which the monotonic clock went on', 3_600_000, 3_600_000, 'hidden', 'tabletWoke'],
  ['a sleep in which the monotonic clock stood', 3_600_000, 250, 'hidden', 'tabletWoke'],
  ['a freeze, however short', 400, 400, 'frozen', 'tabletWoke'],
  ['a freeze in which the clock was set back', -3_600_000, 400, 'frozen', 'tabletWoke'],
  ['a clock set forward in view', 3_600_000, 250, 'awake', 'clockSet'],
  ['a clock set back in view', -3_600_000, 250, 'awake', 'clockSet'],
  ['a clock set back while hidden', -3_600_000, 250, 'hidden', 'clockSet'],
  ['a small step forward while hidden', 4000, 250, 'hidden', 'clockSet'],
  ['2 s apart exactly', 2250, 250, 'awake', null],
  ['just over 2 s apart', 2251, 250, 'awake', 'clockSet'],
  ['just over 2 s behind', -1751, 250, 'awake', 'clockSet'],
] as const)('%s', (_name, wallMs, monoMs, rest, kind) => {
  expect(jump(wallMs, monoMs, rest)?.kind ?? null).toBe(kind);
});

test('only a wall clock that ran ahead alone is uncertain', () => {
  expect(jump(3_600_000, 250, 'hidden')?.certain).toBe(false);
  expect(jump(3_600_000, 250)?.certain).toBe(false);
  expect(jump(-3_600_000, 250)?.certain).toBe(true);
  expect(jump(60_000, 60_000)?.certain).toBe(true);
});

test('law: a jump tells exactly what both clocks say has passed', () => {
  fc.assert(
    fc.property(
      fc.integer({ min: -1e8, max: 1e8 }),
      fc.integer({ min: 0, max: 1e8 }),
      fc.constantFrom<Rest>('awake', 'hidden', 'frozen'),
      (wallMs, monoMs, rest) => {
        const found = jump(wallMs, monoMs, rest);
        if (found === null) {
          expect(Math.abs(wallMs - monoMs)).toBeLessThanOrEqual(2000);
          expect(monoMs).toBeLessThanOrEqual(5000);
        } else expect(found).toMatchObject({ wallMs, monoMs });
      },
    ),
    { numRuns: 500 },
  );
});
