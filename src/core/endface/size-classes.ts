import type { CriterionSet, SizeBands } from './criterion.ts';

type Edge = NonNullable<SizeBands[number]['until']>;

/** A range of sizes that every zone of a set treats alike: what a person chooses instead of a number. */
export interface SizeClass {
  /** Null for the smallest class; `including` says whether the edge itself belongs to this class. */
  readonly from: Edge | null;
  /** Null for the largest. */
  readonly until: Edge | null;
  /** The size that is kept for it; it is an estimate and shown as one. */
  readonly standsForUm: number;
}

/** How much larger than the last edge "any larger" is taken to be; it decides nothing. */
const openEndFactor = 1.5;
const withoutEdgesUm = 1;

export function sizeClasses(set: CriterionSet, kind: 'scratch' | 'defect'): SizeClass[] {
  const bands = set.zones.flatMap((zone) => (kind === 'scratch' ? zone.scratches : zone.defects));
  const edges = bands
    .flatMap(({ until }) => until ?? [])
    .toSorted((a, b) => a.um - b.um || Number(a.including) - Number(b.including))
    .filter((edge, index, all) => !isSame(edge, all[index - 1]));
  return [...edges, null].map((until, index) => {
    const below = edges[index - 1];
    const from = below === undefined ? null : { um: below.um, including: !below.including };
    return { from, until, standsForUm: middle(from, until) };
  });
}

const isSame = (edge: Edge, other: Edge | undefined): boolean =>
  other !== undefined && edge.um === other.um && edge.including === other.including;

function middle(from: Edge | null, until: Edge | null): number {
  if (until !== null) return ((from?.um ?? 0) + until.um) / 2;
  return from === null ? withoutEdgesUm : from.um * openEndFactor;
}

/** The class that a size lies in. */
export function classOfSize(classes: readonly SizeClass[], sizeUm: number): SizeClass | null {
  const isInside = ({ until }: SizeClass): boolean =>
    until === null || sizeUm < until.um || (until.including && sizeUm === until.um);
  return classes.find(isInside) ?? null;
}
