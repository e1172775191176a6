import type { Basis } from '../unit/basis.ts';
import type { NumberRange } from '../unit/number-check.ts';

/** How far the fibre may lie below the ferrule, in nm as a positive number. */
export type UndercutLimit =
  | { readonly kind: 'fixed'; readonly mostNm: number }
  | {
      readonly kind: 'by radius';
      /** Of the radius in mm to the power of 0, 1, 2 and 3. */
      readonly coefficientsNm: readonly [number, number, number, number];
    };

/** The deepest undercut in nm at a radius; only for a radius inside its own limits. */
export function mostUndercutNm(limit: UndercutLimit, radiusMm: number): number {
  if (limit.kind === 'fixed') return limit.mostNm;
  const [constant, linear, square, cube] = limit.coefficientsNm;
  return ((cube * radiusMm + square) * radiusMm + linear) * radiusMm + constant;
}

/** What a polished end must measure. Every limit belongs to the good side. */
export interface GeometryLimits {
  readonly id: string;
  readonly name: string;
  readonly edition: string;
  readonly basis: Basis;
  readonly ferrulesMm: readonly number[];
  readonly polish: 'PC' | 'APC';
  readonly radiusMm: NumberRange;
  readonly mostApexOffsetUm: number;
  readonly mostProtrusionNm: number;
  readonly undercut: UndercutLimit;
  /** Only an angled end has an angle and an error of its key. */
  readonly angled: null | {
    readonly angleDeg: number;
    readonly toleranceDeg: number;
    readonly mostKeyErrorDeg: number;
  };
}
