import type { Basis } from '../unit/basis.ts';
import { decimal, isAtMost } from '../unit/decimal.ts';

/** What a zone is made of, as the words catalogue names it. */
export type ZonePart = 'core' | 'cladding' | 'adhesive' | 'contact' | 'fibre' | 'ferrule';

/** Sizes up to an edge, or all that are larger. */
export interface SizeBand {
  readonly until: { readonly um: number; readonly including: boolean } | null;
  /** How many of this size or larger may stand in the zone; null: no limit. */
  readonly most: number | null;
}

/** Bands from the smallest size to "any larger", whose limits never rise with size. */
export type SizeBands = readonly SizeBand[];

/** A ring of the end face; the innermost begins at 0. */
export interface CriterionZone {
  /** As the criterion calls it: "A". */
  readonly letter: string;
  readonly part: ZonePart;
  readonly innerDiameterUm: number;
  readonly outerDiameterUm: number;
  /** By width. */
  readonly scratches: SizeBands;
  /** By diameter. */
  readonly defects: SizeBands;
}

/** A named set of rules for what an end face may show. */
export interface CriterionSet {
  readonly id: string;
  /** As recipes name it. */
  readonly name: string;
  readonly edition: string;
  readonly fibre: 'single-mode' | 'multimode' | 'either';
  readonly basis: Basis;
  /** From the inside out, without gaps. What lies outside the last is not judged by size. */
  readonly zones: readonly CriterionZone[];
  /** After so many cleanings what is still there counts as permanent. */
  readonly cleanings: { readonly most: number; readonly basis: Basis };
}

/** The zone that holds a point; a border belongs to the inner zone, the stricter one. Null outside the last. */
export function zoneOf(set: CriterionSet, fromCentreUm: number): CriterionZone | null {
  return set.zones.find((zone) => isAtMost(2 * fromCentreUm, zone.outerDiameterUm)) ?? null;
}

/** Whether a size lies in the part of a band list from `band` on, which means: in that band or a larger one. */
export function reachesBand(sizeUm: number, bands: SizeBands, band: number): boolean {
  const below = bands[band - 1]?.until;
  return below === undefined || below === null || isPast(sizeUm, below);
}

function isPast(sizeUm: number, edge: { readonly um: number; readonly including: boolean }): boolean {
  const size = decimal(sizeUm);
  return edge.including ? size > decimal(edge.um) : size >= decimal(edge.um);
}

export interface CriterionStamp {
  readonly id: string;
  readonly name: string;
  readonly edition: string;
  readonly unconfirmed: boolean;
}
