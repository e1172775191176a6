import { faceDiagnoses } from './diagnoses-face.ts';
import { measuredDiagnoses } from './diagnoses-measured.ts';
import type { Diagnosis } from './diagnosis.ts';
import type { DefectLook, Finding, ScratchLook } from './finding.ts';
import { isOut, type GeometryCheck, type GeometryField } from './judge-geometry.ts';

/** Every diagnosis that comes with the app. */
export const diagnoses: readonly Diagnosis[] = [...faceDiagnoses, ...measuredDiagnoses];

/** Null where nothing is known under that code. */
export function diagnosisOf(code: string): Diagnosis | null {
  return diagnoses.find((diagnosis) => diagnosis.code === code) ?? null;
}

const codeOfScratch: Readonly<Record<ScratchLook, string>> = { 'one line': 'scratch', 'fine lines': 'fine-lines' };
const codeOfDefect: Readonly<Record<DefectLook, string | null>> = {
  pit: 'pits',
  chip: 'chip',
  hackle: 'hackle',
  adhesive: 'adhesive-on-face',
  void: 'void',
  'uneven ring': 'adhesive-ring',
  'fibre off centre': 'adhesive-ring',
  other: null,
};

function codeOfFinding(finding: Finding): string | null {
  switch (finding.kind) {
    case 'scratch':
      return codeOfScratch[finding.looks];
    case 'defect':
      return codeOfDefect[finding.looks];
    case 'contamination':
      return 'contamination';
    case 'crack':
      return 'crack';
    case 'no light':
      return 'broken-fibre';
  }
}

/** What findings usually mean, each once; ends that cannot be saved first, then the earliest step to go back to. */
export function diagnoseFace(findings: readonly Finding[]): Diagnosis[] {
  return inOrder(findings.map(codeOfFinding));
}

const codeOfCheck: Readonly<Record<GeometryField, { readonly below: string; readonly above: string }>> = {
  radiusMm: { below: 'radius-low', above: 'radius-high' },
  apexOffsetUm: { below: 'apex', above: 'apex' },
  fibreHeightNm: { below: 'undercut', above: 'protrusion' },
  angleDeg: { below: 'angle', above: 'angle' },
  keyErrorDeg: { below: 'angle', above: 'angle' },
};

/** What measured geometry usually means; nothing where all of it is within its limits. */
export function diagnoseGeometry(checks: readonly GeometryCheck[]): Diagnosis[] {
  return inOrder(
    checks.filter(isOut).map(({ field, tells }) => codeOfCheck[field][tells === 'below' ? 'below' : 'above']),
  );
}

/** The step that undoes most stands first: going back to it passes the later ones again. */
const waysInOrder: readonly Diagnosis['back'][] = [
  'reterminate',
  'polish in air',
  'coarse film',
  'middle film',
  'fine film',
  'final film',
  'clean',
  'dress the cable',
  'measure again',
];

function inOrder(codes: readonly (string | null)[]): Diagnosis[] {
  const found = diagnoses.filter(({ code }) => codes.includes(code));
  return found.toSorted((a, b) => waysInOrder.indexOf(a.back) - waysInOrder.indexOf(b.back));
}
