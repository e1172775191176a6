import { isUnconfirmed } from '../unit/basis.ts';
import { checkCount, type NumberRefusal } from '../unit/number-check.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import { setProblems, type SetProblem } from './check-set.ts';
import { reachesBand, zoneOf, type CriterionSet, type CriterionStamp, type SizeBands } from './criterion.ts';
import { findingsRefusal, type Finding, type FindingRefusal } from './finding.ts';

/** Why a face is not good. `zone` is the letter of the innermost zone concerned; null outside all zones. */
export type FaceReason = { readonly zone: string | null; readonly count: number } & (
  | { readonly rule: 'a crack is never polished out'; readonly source: string }
  | { readonly rule: 'no light through the fibre' }
  | {
      readonly rule: 'too many';
      readonly kind: 'scratch' | 'defect';
      /** Of this size or larger. */
      readonly from: { readonly um: number; readonly including: boolean } | null;
      readonly most: number;
    }
  | { readonly rule: 'stays after cleaning'; readonly mostCleanings: number }
  | { readonly rule: 'clean and look again'; readonly cleaningsLeft: number }
);

export type FaceVerdict = { readonly criterion: CriterionStamp } & (
  | { readonly verdict: 'pass' }
  | { readonly verdict: 'clean and look again'; readonly decided: FaceReason }
  | {
      readonly verdict: 'fail';
      /** The gravest; the first of all reasons. */
      readonly decided: FaceReason;
      readonly reasons: readonly FaceReason[];
      readonly mends: 'rework' | 'reterminate or scrap';
    }
);

export type FaceRefusal =
  | ({ readonly code: 'finding unfit' } & { readonly refusal: FindingRefusal })
  | { readonly code: 'cleanings unfit'; readonly refusal: NumberRefusal<'cleanings'> }
  | { readonly code: 'too many findings'; readonly found: number; readonly most: number }
  | { readonly code: 'criterion unfit'; readonly problems: readonly SetProblem[] };

const crackSource = 'NASA-STD-8739.5A: re-polishing to fix a crack is prohibited; reterminate or scrap';
const mostFindings = 1000;

/**
 * Judges what was seen, in any order, by a criterion. `cleanings` is how often the face was cleaned since the first
 * look. The gravest reason decides: crack, no light, too many, what cleaning does not remove, what it may.
 */
export function judgeFace(
  set: CriterionSet,
  findings: readonly Finding[],
  cleanings = 0,
): Result<FaceVerdict, FaceRefusal> {
  const refusal = faceRefusal(set, findings, cleanings);
  if (refusal) return failed(refusal);
  const { id, name, edition, basis } = set;
  const criterion = { id, name, edition, unconfirmed: isUnconfirmed(basis) };
  const reasons = [...lasting(set, findings), ...tooMany(set, findings), ...dirt(set, findings, cleanings)];
  const [decided] = reasons;
  if (decided === undefined) return ok({ criterion, verdict: 'pass' });
  if (decided.rule === 'clean and look again') return ok({ criterion, verdict: decided.rule, decided });
  const isLasting = decided.rule === 'a crack is never polished out' || decided.rule === 'no light through the fibre';
  const mends = isLasting ? 'reterminate or scrap' : 'rework';
  return ok({ criterion, verdict: 'fail', decided, reasons, mends });
}

/** Worse is higher. */
export function faceSeverity(verdict: FaceVerdict): number {
  if (verdict.verdict === 'pass') return 0;
  if (verdict.verdict === 'clean and look again') return 1;
  return verdict.mends === 'rework' ? 2 : 3;
}

function faceRefusal(set: CriterionSet, findings: readonly Finding[], cleanings: number): FaceRefusal | null {
  const problems = setProblems(set);
  if (problems.length > 0) return { code: 'criterion unfit', problems };
  const refusal = checkCount('cleanings', cleanings, { lowest: 0, highest: 100 });
  if (refusal) return { code: 'cleanings unfit', refusal };
  if (findings.length > mostFindings) {
    return { code: 'too many findings', found: findings.length, most: mostFindings };
  }
  const unfit = findingsRefusal(findings);
  return unfit && { code: 'finding unfit', refusal: unfit };
}

const countOf = (findings: readonly Finding[]): number => findings.reduce((sum, { count }) => sum + count, 0);

/** The letter of the innermost zone of some findings. */
function innermost(set: CriterionSet, findings: readonly Finding[]): string | null {
  return zoneOf(set, Math.min(...findings.map(({ fromCentreUm }) => fromCentreUm)))?.letter ?? null;
}

function lasting(set: CriterionSet, findings: readonly Finding[]): FaceReason[] {
  const cracks = findings.filter(({ kind }) => kind === 'crack');
  const dark = findings.filter(({ kind }) => kind === 'no light');
  const reasons: FaceReason[] = [];
  if (cracks.length > 0) {
    const rule = 'a crack is never polished out';
    reasons.push({ rule, zone: innermost(set, cracks), count: countOf(cracks), source: crackSource });
  }
  if (dark.length > 0) {
    reasons.push({ rule: 'no light through the fibre', zone: innermost(set, dark), count: countOf(dark) });
  }
  return reasons;
}

/** From the inside out, scratches before defects, the largest size first. */
function tooMany(set: CriterionSet, findings: readonly Finding[]): FaceReason[] {
  return set.zones.flatMap((zone) => {
    const inZone = findings.filter(({ fromCentreUm }) => zoneOf(set, fromCentreUm) === zone);
    return [
      ...overLimits(zone.letter, 'scratch', inZone, zone.scratches),
      ...overLimits(zone.letter, 'defect', inZone, zone.defects),
    ];
  });
}

function overLimits(
  zone: string,
  kind: 'scratch' | 'defect',
  inZone: readonly Finding[],
  bands: SizeBands,
): FaceReason[] {
  return bands
    .flatMap(({ most }, band): FaceReason[] => {
      const reaching = inZone.filter((finding) => finding.kind === kind && reachesBand(finding.sizeUm, bands, band));
      const count = countOf(reaching);
      if (most === null || count <= most) return [];
      const below = bands[band - 1]?.until ?? null;
      // What a band leaves out, the next one takes in: "above 3" follows "up to and including 3".
      const from = below && { um: below.um, including: !below.including };
      return [{ rule: 'too many', zone, kind, from, most, count }];
    })
    .reverse();
}

function dirt(set: CriterionSet, findings: readonly Finding[], cleanings: number): FaceReason[] {
  const dirty = findings.filter(({ kind }) => kind === 'contamination');
  if (dirty.length === 0) return [];
  const { most } = set.cleanings;
  const common = { zone: innermost(set, dirty), count: countOf(dirty) };
  return [
    cleanings < most
      ? { rule: 'clean and look again', cleaningsLeft: most - cleanings, ...common }
      : { rule: 'stays after cleaning', mostCleanings: most, ...common },
  ];
}
