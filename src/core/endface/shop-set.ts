import { confirmBasis, type ConfirmRefusal, type Confirmation } from '../unit/basis.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import { setProblems, type SetProblem } from './check-set.ts';
import type { CriterionSet } from './criterion.ts';
import { shippedSets } from './shipped-sets.ts';

/** A set as the shop writes it: its basis is the person who answers for it. */
export type SetDraft = Omit<CriterionSet, 'basis' | 'cleanings'> & { readonly mostCleanings: number };

export type ShopSetRefusal =
  | { readonly code: 'name missing' }
  | { readonly code: 'set unfit'; readonly problems: readonly SetProblem[] }
  /** A shipped set keeps its id and its name, so that a record always means the same rules. */
  | { readonly code: 'set exists'; readonly id: string };

/** A set of the shop's own, under an id and a name that no other set has. */
export function shopSet(
  draft: SetDraft,
  by: Confirmation,
  others: readonly CriterionSet[] = [],
): Result<CriterionSet, ShopSetRefusal> {
  if (by.by.trim() === '') return failed({ code: 'name missing' });
  const { mostCleanings, ...rest } = draft;
  const basis = { rests: 'set by the shop', confirmed: by } as const;
  const set: CriterionSet = { ...rest, basis, cleanings: { most: mostCleanings, basis } };
  const problems = setProblems(set);
  if (problems.length > 0) return failed({ code: 'set unfit', problems });
  const taken = [...shippedSets, ...others].find(({ id, name }) => id === set.id || name === set.name);
  return taken ? failed({ code: 'set exists', id: taken.id }) : ok(set);
}

/** The same set, answered for by the shop after it was compared with the bought text. */
export function confirmSet(set: CriterionSet, by: Confirmation): Result<CriterionSet, ConfirmRefusal> {
  const basis = confirmBasis(set.basis, by);
  if (!basis.ok) return basis;
  const cleanings = confirmBasis(set.cleanings.basis, by);
  return ok({
    ...set,
    basis: basis.value,
    cleanings: cleanings.ok ? { ...set.cleanings, basis: cleanings.value } : set.cleanings,
  });
}
