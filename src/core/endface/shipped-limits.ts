import type { Basis } from '../unit/basis.ts';
import type { GeometryLimits, UndercutLimit } from './geometry-limits.ts';

/** Two recollections agree; no text that can be cited was found. */
const undercutByRadius: UndercutLimit = { kind: 'by radius', coefficientsNm: [325, -31, 1.3, -0.02] };
const memory = (source: string): Basis => ({ rests: 'from memory', source, confirmed: null });

const pc = {
  polish: 'PC',
  mostApexOffsetUm: 50,
  mostProtrusionNm: 50,
  undercut: undercutByRadius,
  angled: null,
} as const;
const apc = {
  polish: 'APC',
  ferrulesMm: [1.25, 2.5],
  radiusMm: { lowest: 5, highest: 12 },
  mostApexOffsetUm: 50,
  mostProtrusionNm: 100,
  undercut: { kind: 'fixed', mostNm: 100 },
} as const;

export const shippedGeometryLimits: readonly GeometryLimits[] = [
  {
    ...pc,
    id: 'pc-2-5',
    name: 'PC, 2.5 mm ferrule',
    edition: 'IEC 61755-3-1',
    basis: memory('IEC 61755-3-1'),
    ferrulesMm: [2.5],
    radiusMm: { lowest: 10, highest: 25 },
  },
  {
    ...pc,
    id: 'pc-2-5-wide',
    name: 'PC, 2.5 mm ferrule, wide radius',
    edition: 'GR-326',
    basis: memory('GR-326'),
    ferrulesMm: [2.5],
    radiusMm: { lowest: 7, highest: 25 },
  },
  {
    ...pc,
    id: 'pc-1-25',
    name: 'PC, 1.25 mm ferrule',
    edition: 'IEC 61755-3-1',
    basis: memory('IEC 61755-3-1'),
    ferrulesMm: [1.25],
    radiusMm: { lowest: 7, highest: 25 },
  },
  {
    ...apc,
    id: 'apc-8',
    name: 'APC 8°',
    edition: 'IEC 61755-3-2',
    basis: memory('IEC 61755-3-2; tolerances of angle and key differ between editions'),
    angled: { angleDeg: 8, toleranceDeg: 0.2, mostKeyErrorDeg: 0.5 },
  },
  {
    ...apc,
    id: 'apc-8-wide',
    name: 'APC 8°, wide angle',
    edition: 'older editions and GR-326',
    basis: memory('older editions of IEC 61755-3-2, and GR-326'),
    angled: { angleDeg: 8, toleranceDeg: 0.5, mostKeyErrorDeg: 0.5 },
  },
];
