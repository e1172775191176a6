import type { NumberRange } from '../unit/number-check.ts';
import type { GradedModes } from './multimode.ts';

/** A single-mode fibre at one wavelength; the mode field is its diameter. */
export interface SingleModeFibre {
  readonly kind: 'single-mode';
  readonly modeFieldUm: number;
  readonly wavelengthNm: number;
  readonly glassIndex: number;
}

export type Profile = { readonly kind: 'step' } | { readonly kind: 'graded'; readonly modes: GradedModes };

export interface MultimodeFibre {
  readonly kind: 'multimode';
  readonly coreUm: number;
  readonly numericalAperture: number;
  readonly glassIndex: number;
  readonly profile: Profile;
}

/** What lies between the two ends. In contact there is no step of index. */
export type Between = { readonly kind: 'contact' } | { readonly kind: 'gap'; readonly mediumIndex: number };

/** What the formulas are asked about: wide enough for every silica fibre, narrow enough to notice a wrong unit. */
export const fibreRanges = {
  modeFieldUm: { lowest: 2, highest: 30 },
  wavelengthNm: { lowest: 400, highest: 2000 },
  glassIndex: { lowest: 1.3, highest: 2 },
  coreUm: { lowest: 10, highest: 1000 },
  numericalAperture: { lowest: 0.05, highest: 0.6 },
  mediumIndex: { lowest: 1, highest: 2 },
} as const satisfies Record<string, NumberRange>;
