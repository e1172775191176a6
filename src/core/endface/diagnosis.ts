import type { Basis } from '../unit/basis.ts';

/** The kind of step that mends a finding; which step of a recipe that is, the recipe says. */
export type WayBack =
  /** Cut off and begun anew: the end cannot be saved. */
  | 'reterminate'
  | 'polish in air'
  /** The film that forms radius, angle and apex. */
  | 'coarse film'
  | 'middle film'
  | 'fine film'
  | 'final film'
  | 'clean'
  /** Nothing is done to the connector before the reading is trusted. */
  | 'measure again'
  /** Boot, tie or cable are laid anew. */
  | 'dress the cable';

/** What was found, what usually causes it, and what to do. */
export interface Diagnosis {
  readonly code: string;
  /** The recipe's defect that it is recorded as; null where the recipes have none. */
  readonly defect: string | null;
  readonly texts: {
    readonly en: { readonly looksLike: string; readonly usualCauses: readonly string[]; readonly action: string };
  };
  readonly back: WayBack;
  readonly basis: Basis;
}

/** Ways back to a film. */
export const polishingWays: readonly WayBack[] = [
  'polish in air',
  'coarse film',
  'middle film',
  'fine film',
  'final film',
];
