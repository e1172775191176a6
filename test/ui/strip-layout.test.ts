import { expect, test } from 'vitest';
import { layoutStrip } from '../../src/ui/strip-layout.ts';

/** Lengths: common practice, no source. Buffer 900 µm: MIL-PRF-85045/18. Cladding 125 µm: from memory. */
const sizes = {
  jacketOffMm: { nominalMm: 30, toleranceMm: 0.5 },
  strengthMemberMm: { nominalMm: 6, toleranceMm: 1 },
  bareGlassMm: { nominalMm: 16, toleranceMm: 0.5 },
  jacketDiameterMm: 3,
  bufferDiameterUm: 900,
  claddingDiameterUm: 125,
};

test.each([280, 560, 900])('at %d px lengths and diameters keep their ratios', (width) => {
  const drawn = layoutStrip(sizes, width);
  const length = ({ from, to }: { from: number; to: number }): number => to - from;
  expect(length(drawn.bareGlass) / length(drawn.jacketOff)).toBeCloseTo(16 / 30, 9);
  expect(length(drawn.strengthMember) / length(drawn.jacketOff)).toBeCloseTo(6 / 30, 9);
  expect(drawn.bufferHeight / drawn.jacketHeight).toBeCloseTo(0.3, 9);
  expect(drawn.glassHeight / drawn.bufferHeight).toBeCloseTo(125 / 900, 9);
  expect(drawn.jacketHeight / drawn.pxPerMm).toBeCloseTo(3 * drawn.exaggeration, 9);
  expect(length(drawn.strengthMember.band) / drawn.pxPerMm).toBeCloseTo(2, 9);
});

test('with the tolerance it still fits', () => {
  const { tip, pxPerMm } = layoutStrip(sizes, 560);
  expect(tip + 0.5 * pxPerMm).toBeLessThanOrEqual(560);
});
