import type { Moment } from './moment.ts';
import { failed, ok, type Result } from './result.ts';

/** Who answered for a figure, and when. */
export interface Confirmation {
  readonly by: string;
  readonly at: Moment;
}

/** What a figure or a table rests on. What was published or computed needs nobody's word. */
export type Basis =
  | { readonly rests: 'published' | 'computed'; readonly source: string }
  | { readonly rests: 'from memory'; readonly source: string; readonly confirmed: Confirmation | null }
  | { readonly rests: 'common practice, no source'; readonly confirmed: Confirmation | null }
  | { readonly rests: 'set by the shop'; readonly confirmed: Confirmation };

/** Shown as such wherever the figure decides: nothing published was read and nobody in the shop has confirmed it. */
export function isUnconfirmed(basis: Basis): boolean {
  return 'confirmed' in basis && basis.confirmed === null;
}

export type ConfirmRefusal = { readonly code: 'name missing' } | { readonly code: 'nothing to confirm' };

/** The same basis, answered for. A later confirmation replaces an earlier one. */
export function confirmBasis(basis: Basis, confirmation: Confirmation): Result<Basis, ConfirmRefusal> {
  if (confirmation.by.trim() === '') return failed({ code: 'name missing' });
  if (!('confirmed' in basis)) return failed({ code: 'nothing to confirm' });
  return ok({ ...basis, confirmed: confirmation });
}
