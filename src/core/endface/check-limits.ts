import { mostUndercutNm, type GeometryLimits, type UndercutLimit } from './geometry-limits.ts';

export type LimitsProblem =
  | { readonly code: 'text unfit'; readonly field: 'id' | 'name' | 'edition' }
  | { readonly code: 'radius unfit' }
  | { readonly code: 'ferrule unfit' }
  | { readonly code: 'limit unfit'; readonly field: 'mostApexOffsetUm' | 'mostProtrusionNm' | 'angled' }
  | { readonly code: 'angle without polish' }
  /** Somewhere inside the limits of the radius the undercut limit is not a depth. */
  | { readonly code: 'undercut unfit' };

const isWithin = (value: number, lowest: number, highest: number): boolean => value >= lowest && value <= highest;
const largestRadiusMm = 1000;
const deepestNm = 10_000;
/** Fine enough to notice a polynomial that turns within the limits of the radius. */
const radiusSteps = 100;

/** All that keeps limits from judging; empty where they may. */
export function limitsProblems(limits: GeometryLimits): LimitsProblem[] {
  const { lowest, highest } = limits.radiusMm;
  const problems: LimitsProblem[] = [];
  if (!/^[a-z0-9]+(-[a-z0-9]+)*$/.test(limits.id)) problems.push({ code: 'text unfit', field: 'id' });
  for (const field of ['name', 'edition'] as const) {
    if (limits[field].trim() === '' || limits[field].length > 120) problems.push({ code: 'text unfit', field });
  }
  const areFerrulesFit = limits.ferrulesMm.length > 0 && limits.ferrulesMm.every((mm) => isWithin(mm, 0.5, 5));
  if (!areFerrulesFit) problems.push({ code: 'ferrule unfit' });
  const isRadiusFit = lowest > 0 && isWithin(highest, lowest, largestRadiusMm);
  if (!isRadiusFit) problems.push({ code: 'radius unfit' });
  for (const field of ['mostApexOffsetUm', 'mostProtrusionNm'] as const) {
    if (!isWithin(limits[field], 0, deepestNm)) problems.push({ code: 'limit unfit', field });
  }
  if ((limits.angled !== null) !== (limits.polish === 'APC')) problems.push({ code: 'angle without polish' });
  if (limits.angled && !isAngledFit(limits.angled)) problems.push({ code: 'limit unfit', field: 'angled' });
  if (isRadiusFit && !isUndercutFit(limits.undercut, lowest, highest)) problems.push({ code: 'undercut unfit' });
  return problems;
}

function isAngledFit({ angleDeg, toleranceDeg, mostKeyErrorDeg }: NonNullable<GeometryLimits['angled']>): boolean {
  return isWithin(angleDeg, 0, 45) && isWithin(toleranceDeg, 0, 10) && isWithin(mostKeyErrorDeg, 0, 180);
}

function isUndercutFit(undercut: UndercutLimit, lowestMm: number, highestMm: number): boolean {
  return Array.from({ length: radiusSteps + 1 }, (_, step) => lowestMm + ((highestMm - lowestMm) * step) / radiusSteps)
    .map((radiusMm) => mostUndercutNm(undercut, radiusMm))
    .every((depthNm) => isWithin(depthNm, 0, deepestNm));
}
