import fc from 'fast-check';
import { expect, test } from 'vitest';
import { filmGrains } from '../../src/ui/film-grains.ts';

test('grains keep their ratio to the coarsest film, stay on the sheet and apart', () => {
  const film = fc.double({ min: 0.02, max: 60, noNaN: true });
  fc.assert(
    fc.property(film, film, fc.integer({ min: 30, max: 120 }), (one, other, side) => {
      const [fine, coarse] = [Math.min(one, other), Math.max(one, other)];
      const { radius, at } = filmGrains(fine, coarse, side);
      expect(radius).toBeCloseTo(Math.max(0.7, (fine / coarse) * side * 0.1), 9);
      expect(at.length).toBeGreaterThan(0);
      for (const { x, y } of at) {
        expect(Math.min(x, y) - radius).toBeGreaterThanOrEqual(0);
        expect(Math.max(x, y) + radius).toBeLessThanOrEqual(side);
      }
    }),
    { numRuns: 100 },
  );
});
