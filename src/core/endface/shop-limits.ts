import { confirmBasis, type ConfirmRefusal, type Confirmation } from '../unit/basis.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import { limitsProblems, type LimitsProblem } from './check-limits.ts';
import type { GeometryLimits } from './geometry-limits.ts';
import { shippedGeometryLimits } from './shipped-limits.ts';

export type ShopLimitsRefusal =
  | { readonly code: 'name missing' }
  | { readonly code: 'limits unfit'; readonly problems: readonly LimitsProblem[] }
  | { readonly code: 'limits exist'; readonly id: string };

/** Limits of the shop's own, under an id and a name that no others have. */
export function shopLimits(
  draft: Omit<GeometryLimits, 'basis'>,
  by: Confirmation,
  others: readonly GeometryLimits[] = [],
): Result<GeometryLimits, ShopLimitsRefusal> {
  if (by.by.trim() === '') return failed({ code: 'name missing' });
  const limits: GeometryLimits = { ...draft, basis: { rests: 'set by the shop', confirmed: by } };
  const problems = limitsProblems(limits);
  if (problems.length > 0) return failed({ code: 'limits unfit', problems });
  const taken = [...shippedGeometryLimits, ...others].find(({ id, name }) => id === limits.id || name === limits.name);
  return taken ? failed({ code: 'limits exist', id: taken.id }) : ok(limits);
}

/** The same limits, answered for by the shop after they were compared with the bought text. */
export function confirmLimits(limits: GeometryLimits, by: Confirmation): Result<GeometryLimits, ConfirmRefusal> {
  const basis = confirmBasis(limits.basis, by);
  return basis.ok ? ok({ ...limits, basis: basis.value }) : basis;
}
