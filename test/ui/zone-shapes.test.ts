import fc from 'fast-check';
import { expect, test } from 'vitest';
import { scaleFor, toPx, toUm, zoneAt, type Zone } from '../../src/ui/zone-shapes.ts';

/** Diameters: from memory, IEC 61300-3-35 edition 2, single-mode. */
const zone = (letter: string, innerDiameterUm: number, outerDiameterUm: number): Zone => ({
  id: letter,
  letter,
  name: letter,
  innerDiameterUm,
  outerDiameterUm,
});
const zones = [zone('A', 0, 25), zone('B', 25, 115), zone('C', 115, 135), zone('D', 135, 250)];

test.each([
  [0, 0, 'A'],
  [12.5, 0, 'A'],
  [12.6, 0, 'B'],
  [0, -57, 'B'],
  [60, 0, 'C'],
  [0, 125, 'D'],
  [90, 90, null],
])('a tap at %d, %d µm lies in %s: radius is not diameter', (xUm, yUm, letter) => {
  expect(zoneAt(zones, xUm, yUm)?.letter ?? null).toBe(letter);
});

test('px and µm are each other reversed, whatever the size', () => {
  fc.assert(
    fc.property(fc.integer({ min: 100, max: 900 }), fc.integer({ min: -120, max: 120 }), (sizePx, um) => {
      const scale = scaleFor(zones, sizePx);
      expect(toUm(sizePx / 2 + toPx(um, scale), sizePx / 2, scale).xUm).toBeCloseTo(um, 9);
    }),
    { numRuns: 200 },
  );
});
