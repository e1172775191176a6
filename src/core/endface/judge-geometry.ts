import { isUnconfirmed } from '../unit/basis.ts';
import { decimal, isAtLeast, isAtMost } from '../unit/decimal.ts';
import { checkTyped, type NumberRange, type NumberRefusal, type TypingRange } from '../unit/number-check.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import type { CriterionStamp } from './criterion.ts';
import { limitsProblems, type LimitsProblem } from './check-limits.ts';
import { mostUndercutNm, type GeometryLimits } from './geometry-limits.ts';

/** What was measured; what was not is left out. */
export interface GeometryReadings {
  readonly radiusMm?: number;
  /** A distance, never negative. */
  readonly apexOffsetUm?: number;
  /** Above zero the fibre stands out of the ferrule, below zero it lies under it. */
  readonly fibreHeightNm?: number;
  readonly angleDeg?: number;
  /** Of either sign. */
  readonly keyErrorDeg?: number;
}

export type GeometryField = keyof GeometryReadings;

/** What an interferometer can show, and what needs no question. Common practice, no source. */
export const geometryTyping: Readonly<Record<GeometryField, TypingRange>> = {
  radiusMm: { possible: { lowest: 0.1, highest: 10_000 }, usual: { lowest: 2, highest: 60 } },
  apexOffsetUm: { possible: { lowest: 0, highest: 1250 }, usual: { lowest: 0, highest: 300 } },
  fibreHeightNm: { possible: { lowest: -100_000, highest: 100_000 }, usual: { lowest: -1000, highest: 1000 } },
  angleDeg: { possible: { lowest: 0, highest: 45 }, usual: { lowest: 0, highest: 12 } },
  keyErrorDeg: { possible: { lowest: -180, highest: 180 }, usual: { lowest: -5, highest: 5 } },
};

export type GeometryCheck = { readonly field: GeometryField; readonly found: number } & (
  | ({ readonly tells: 'within'; readonly typed: Typed } & NumberRange)
  | ({ readonly tells: 'below' | 'above'; readonly typed: Typed } & NumberRange)
  /** A limit that goes by the radius says nothing before the radius is known and good. */
  | { readonly tells: 'waits for the radius' | 'radius out of range'; readonly typed: Typed }
);
type Typed = 'usual' | 'unusual';

export interface GeometryVerdict {
  readonly limits: CriterionStamp;
  /** "open" while a quantity of the limits is missing and none is out. */
  readonly verdict: 'pass' | 'fail' | 'open';
  /** In the order of the fields; the first that is out decides. */
  readonly checks: readonly GeometryCheck[];
  readonly missing: readonly GeometryField[];
}

export type GeometryRefusal =
  | NumberRefusal<GeometryField>
  | { readonly code: 'not in these limits'; readonly field: GeometryField }
  | { readonly code: 'limits unfit'; readonly problems: readonly LimitsProblem[] };

const straightFields: readonly GeometryField[] = ['radiusMm', 'apexOffsetUm', 'fibreHeightNm'];
const angledFields: readonly GeometryField[] = [...straightFields, 'angleDeg', 'keyErrorDeg'];

/** Which quantities the limits ask for. */
export function askedFields(limits: GeometryLimits): readonly GeometryField[] {
  return limits.angled === null ? straightFields : angledFields;
}

/** Judges what has been measured so far. A radius out of range fails before any limit that goes by it is used. */
export function judgeGeometry(
  limits: GeometryLimits,
  readings: GeometryReadings,
): Result<GeometryVerdict, GeometryRefusal> {
  const problems = limitsProblems(limits);
  if (problems.length > 0) return failed({ code: 'limits unfit', problems });
  const asked = askedFields(limits);
  const checks: GeometryCheck[] = [];
  for (const field of angledFields) {
    const found = readings[field];
    if (found === undefined) continue;
    if (!asked.includes(field)) return failed({ code: 'not in these limits', field });
    const typed = checkTyped(field, found, geometryTyping[field]);
    if (typeof typed !== 'string') return failed(typed);
    checks.push({ field, found, typed, ...compare(found, limitOf(limits, field, readings.radiusMm)) });
  }
  const { id, name, edition, basis } = limits;
  const missing = asked.filter((field) => readings[field] === undefined);
  return ok({
    limits: { id, name, edition, unconfirmed: isUnconfirmed(basis) },
    verdict: checks.some(isOut) ? 'fail' : missing.length > 0 ? 'open' : 'pass',
    checks,
    missing,
  });
}

export const isOut = ({ tells }: GeometryCheck): boolean => tells === 'below' || tells === 'above';

/** Where `why` is given, what lies below the range is not out: it cannot be judged, and this says why. */
type Limit = NumberRange & { readonly why?: 'waits for the radius' | 'radius out of range' };

function limitOf(limits: GeometryLimits, field: GeometryField, radiusMm: number | undefined): Limit {
  const angled = limits.angled ?? { angleDeg: 0, toleranceDeg: 0, mostKeyErrorDeg: 0 };
  switch (field) {
    case 'radiusMm':
      return limits.radiusMm;
    case 'apexOffsetUm':
      return { lowest: 0, highest: limits.mostApexOffsetUm };
    case 'fibreHeightNm':
      return heightLimit(limits, radiusMm);
    case 'angleDeg':
      return around(angled.toleranceDeg, angled.angleDeg);
    case 'keyErrorDeg':
      return around(angled.mostKeyErrorDeg);
  }
}

const around = (most: number, middle = 0): NumberRange => ({
  lowest: decimal(middle - most),
  highest: decimal(middle + most),
});

function heightLimit({ undercut, mostProtrusionNm, radiusMm: range }: GeometryLimits, radiusMm?: number): Limit {
  if (undercut.kind === 'fixed') return { lowest: -undercut.mostNm, highest: mostProtrusionNm };
  // Only an undercut goes by the radius: at or above the ferrule the fibre is judged without it.
  const upwards = { lowest: 0, highest: mostProtrusionNm };
  if (radiusMm === undefined) return { ...upwards, why: 'waits for the radius' };
  const isUsable = isAtLeast(radiusMm, range.lowest) && isAtMost(radiusMm, range.highest);
  if (!isUsable) return { ...upwards, why: 'radius out of range' };
  return { lowest: decimal(-mostUndercutNm(undercut, radiusMm)), highest: mostProtrusionNm };
}

function compare(found: number, { lowest, highest, why }: Limit) {
  if (!isAtMost(found, highest)) return { tells: 'above', lowest, highest } as const;
  if (isAtLeast(found, lowest)) return { tells: 'within', lowest, highest } as const;
  return why === undefined ? ({ tells: 'below', lowest, highest } as const) : { tells: why };
}
