import fc from 'fast-check';
import { expect, test } from 'vitest';
import { foldClocks } from '../../src/ui/clock-rail-fold.ts';

const clock = fc.record({ state: fc.constantFrom('running' as const, 'waiting' as const, 'over' as const) });

test('over is never folded, something is always shown, nothing is lost, order stays', () => {
  fc.assert(
    fc.property(fc.array(clock, { maxLength: 30 }), fc.integer({ min: 0, max: 8 }), (clocks, room) => {
      const { shown, folded } = foldClocks(clocks, room);
      expect(folded.every(({ state }) => state !== 'over')).toBe(true);
      expect(shown.length + folded.length).toBe(clocks.length);
      expect(clocks.filter((one) => shown.includes(one))).toEqual(shown);
      if (clocks.length > 0) expect(shown.length).toBeGreaterThan(0);
    }),
    { numRuns: 300 },
  );
});

test('with room for three, five clocks show two and fold three', () => {
  const clocks = [1, 2, 3, 4, 5].map((id) => ({ id, state: 'running' as const }));
  expect(foldClocks(clocks, 3)).toEqual({ shown: clocks.slice(0, 2), folded: clocks.slice(2) });
  expect(foldClocks(clocks, 5).folded).toEqual([]);
});
