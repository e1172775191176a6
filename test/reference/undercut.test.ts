import { describe, expect, test } from 'vitest';
import { mostUndercutNm } from '../../src/core/endface/geometry-limits.ts';
import { judgeGeometry } from '../../src/core/endface/judge-geometry.ts';
import { shippedGeometryLimits } from '../../src/core/endface/shipped-limits.ts';
import { valueOf } from '../core/optics/value-of.ts';

const limitsOf = (id: string) => {
  const found = shippedGeometryLimits.find((limits) => limits.id === id);
  if (!found) throw new Error(`no limits "${id}"`);
  return found;
};
const { undercut } = limitsOf('pc-2-5');

/** U(R) = -0.02 R³ + 1.3 R² - 31 R + 325 nm, R in mm: from memory; values computed. */
describe('deepest undercut of a PC end by its radius (formula from memory)', () => {
  test.each([
    [5, 200],
    [7, 164.84],
    [8, 149.96],
    [10, 125],
    [12, 105.64],
    [15, 85],
    [18, 71.56],
    [20, 65],
    [22, 59.24],
    [25, 50],
  ])('radius %d mm: %d nm', (radiusMm, depthNm) => expect(mostUndercutNm(undercut, radiusMm)).toBeCloseTo(depthNm, 10));

  test('falls with the radius from 5 to 30 mm, flattest near 21.7 mm at -2.83 nm per mm', () => {
    const slope = (mm: number) => (mostUndercutNm(undercut, mm + 0.005) - mostUndercutNm(undercut, mm - 0.005)) / 0.01;
    const slopes = Array.from({ length: 2501 }, (_, step) => slope(5 + step / 100));
    expect(Math.max(...slopes)).toBeLessThan(0);
    expect(Math.max(...slopes)).toBeCloseTo(-2.83, 2);
    expect(5 + slopes.indexOf(Math.max(...slopes)) / 100).toBeCloseTo(21.7, 1);
  });

  test.each([
    [10, -125, 'pass'],
    [10, -125.01, 'fail'],
    [25, -50, 'pass'],
    [25, -50.01, 'fail'],
    [15, 50, 'pass'],
    [15, 50.01, 'fail'],
  ] as const)('radius %d mm, height %d nm: %s', (radiusMm, fibreHeightNm, verdict) => {
    const judged = valueOf(judgeGeometry(limitsOf('pc-2-5'), { radiusMm, fibreHeightNm, apexOffsetUm: 0 }));
    expect(judged.verdict).toBe(verdict);
  });
});

describe('limits of geometry (from memory, shown as unconfirmed)', () => {
  test.each([
    ['pc-2-5', 10, 25, 50],
    ['pc-2-5-wide', 7, 25, 50],
    ['pc-1-25', 7, 25, 50],
    ['apc-8', 5, 12, 100],
    ['apc-8-wide', 5, 12, 100],
  ])('%s: radius %d to %d mm, apex 50 µm, protrusion %d nm', (id, lowest, highest, mostProtrusionNm) => {
    const limits = limitsOf(id);
    expect(limits).toMatchObject({ radiusMm: { lowest, highest }, mostApexOffsetUm: 50, mostProtrusionNm });
    expect(valueOf(judgeGeometry(limits, {})).limits.unconfirmed).toBe(true);
    expect(limits.basis.rests).toBe('from memory');
  });

  test('an angled end may lie 100 nm under the ferrule, at 8 ± 0.2° (0.5° in older editions)', () => {
    expect(limitsOf('apc-8').undercut).toEqual({ kind: 'fixed', mostNm: 100 });
    expect(limitsOf('apc-8').angled).toMatchObject({ angleDeg: 8, toleranceDeg: 0.2 });
    expect(limitsOf('apc-8-wide').angled).toMatchObject({ angleDeg: 8, toleranceDeg: 0.5 });
  });
});
