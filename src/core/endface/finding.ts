import { checkCount, checkNumber, type NumberRange, type NumberRefusal } from '../unit/number-check.ts';

export const scratchLooks = ['one line', 'fine lines'] as const;
export const defectLooks = [
  'pit',
  'chip',
  'hackle',
  'adhesive',
  'void',
  'uneven ring',
  'fibre off centre',
  'other',
] as const;
export type ScratchLook = (typeof scratchLooks)[number];
export type DefectLook = (typeof defectLooks)[number];

/** What was seen on an end face. Sizes are estimated, not measured. */
export type Finding = {
  /** From the centre of the core to its nearest point: a radius, while zones are given by diameter. */
  readonly fromCentreUm: number;
  /** How many alike. */
  readonly count: number;
} & (
  | {
      readonly kind: 'scratch';
      readonly looks: ScratchLook;
      /** Its width. */
      readonly sizeUm: number;
    }
  | {
      readonly kind: 'defect';
      readonly looks: DefectLook;
      /** The diameter of the smallest circle around it. */
      readonly sizeUm: number;
    }
  | { readonly kind: 'contamination' }
  | { readonly kind: 'crack' }
  | { readonly kind: 'no light' }
);

export type FindingKind = Finding['kind'];
export type SizedFinding = Extract<Finding, { readonly sizeUm: number }>;

export type FindingField = 'fromCentreUm' | 'count' | 'sizeUm';
/** Which finding, from 0, and what is wrong with its number. */
export type FindingRefusal = { readonly finding: number } & NumberRefusal<FindingField>;

/** Out to the rim of a 2.5 mm ferrule; sizes that a bench microscope shows or a field of view holds. */
const ranges: Readonly<Record<FindingField, NumberRange>> = {
  fromCentreUm: { lowest: 0, highest: 1250 },
  count: { lowest: 1, highest: 1000 },
  sizeUm: { lowest: 0.01, highest: 1000 },
};

/** The first number that cannot be. */
export function findingsRefusal(findings: readonly Finding[]): FindingRefusal | null {
  for (const [index, finding] of findings.entries()) {
    const refusal =
      checkNumber('fromCentreUm', finding.fromCentreUm, ranges.fromCentreUm) ??
      checkCount('count', finding.count, ranges.count) ??
      ('sizeUm' in finding ? checkNumber('sizeUm', finding.sizeUm, ranges.sizeUm) : null);
    if (refusal) return { finding: index, ...refusal };
  }
  return null;
}
