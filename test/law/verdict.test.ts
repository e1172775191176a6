import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { setProblems } from '../../src/core/endface/check-set.ts';
import { reachesBand, type CriterionSet, type SizeBands } from '../../src/core/endface/criterion.ts';
import type { Finding } from '../../src/core/endface/finding.ts';
import { faceSeverity, judgeFace } from '../../src/core/endface/judge-face.ts';
import { geometryTyping, judgeGeometry, type GeometryField } from '../../src/core/endface/judge-geometry.ts';
import { shippedSets } from '../../src/core/endface/shipped-sets.ts';
import { shippedGeometryLimits } from '../../src/core/endface/shipped-limits.ts';
import { anySet, cleanings, finding, findings, fromCentreUm, scratchFinding } from '../core/endface/arbitraries.ts';
import { valueOf } from '../core/optics/value-of.ts';

const runs = { numRuns: 500 };
const severity = (set: CriterionSet, seen: readonly Finding[], times: number) =>
  faceSeverity(valueOf(judgeFace(set, seen, times)));

/** The limit that a size meets in a zone. */
function mostOf(bands: SizeBands, sizeUm: number): number {
  const last = bands.findLastIndex((_band, index) => reachesBand(sizeUm, bands, index));
  return bands[last]?.most ?? Infinity;
}

/**
 * Whether the limits for a width grow outward: from every zone to every one outside it there is no limit any more, or
 * nothing was allowed before. Zones are counted each for itself, so a mere larger number outside is not enough.
 */
function growsOutward({ zones }: CriterionSet, sizeUm: number): boolean {
  const most = zones.map(({ scratches }) => mostOf(scratches, sizeUm));
  return most.every((inner, index) => most.slice(index + 1).every((outer) => outer === Infinity || inner === 0));
}

describe('verdict of an end face', () => {
  test('the drawn sets are sound', () => {
    fc.assert(
      fc.property(anySet, (set) => {
        expect(setProblems(set)).toEqual([]);
      }),
      { numRuns: 100 },
    );
  });

  test('never gets better by adding a finding', () => {
    fc.assert(
      fc.property(anySet, findings, finding, cleanings, (set, seen, more, times) => {
        expect(severity(set, [...seen, more], times)).toBeGreaterThanOrEqual(severity(set, seen, times));
      }),
      runs,
    );
  });

  test('never gets better by one more of the same', () => {
    fc.assert(
      fc.property(anySet, findings, finding, cleanings, (set, seen, one, times) => {
        const oneMore = { ...one, count: one.count + 1 };
        expect(severity(set, [...seen, oneMore], times)).toBeGreaterThanOrEqual(severity(set, [...seen, one], times));
      }),
      runs,
    );
  });

  test('never gets better as a finding grows', () => {
    fc.assert(
      fc.property(
        anySet,
        findings,
        scratchFinding,
        fc.double({ min: 0, max: 30, noNaN: true }),
        (set, seen, one, by) => {
          const grown = { ...one, sizeUm: one.sizeUm + by };
          expect(severity(set, [...seen, grown], 0)).toBeGreaterThanOrEqual(severity(set, [...seen, one], 0));
        },
      ),
      runs,
    );
  });

  test('is the same in any order', () => {
    fc.assert(
      fc.property(
        anySet,
        findings.chain((seen) => fc.tuple(fc.constant(seen), fc.shuffledSubarray(seen, { minLength: seen.length }))),
        cleanings,
        (set, [seen, shuffled], times) => {
          expect(judgeFace(set, shuffled, times)).toEqual(judgeFace(set, seen, times));
        },
      ),
      runs,
    );
  });

  test('never gets worse as a scratch moves outward, where the limits for its width grow outward', () => {
    let held = 0;
    fc.assert(
      fc.property(anySet, findings, scratchFinding, fromCentreUm, (set, seen, one, outer) => {
        if (outer < one.fromCentreUm || !growsOutward(set, one.sizeUm)) return;
        held += 1;
        const moved = { ...one, fromCentreUm: outer };
        expect(severity(set, [...seen, moved], 0)).toBeLessThanOrEqual(severity(set, [...seen, one], 0));
      }),
      { numRuns: 1500 },
    );
    expect(held).toBeGreaterThan(300);
  });

  test.each(shippedSets.map((set) => [set.id, set] as const))('limits of scratches grow outward in %s', (_id, set) => {
    for (let sizeUm = 0.5; sizeUm < 20; sizeUm += 0.5) expect(growsOutward(set, sizeUm)).toBe(true);
  });

  test('of another cleaning never gets better while dirt stays', () => {
    fc.assert(
      fc.property(anySet, findings, cleanings, (set, seen, times) => {
        expect(severity(set, seen, times + 1)).toBeGreaterThanOrEqual(severity(set, seen, times));
      }),
      runs,
    );
  });

  test('passes a face with nothing on it, by every criterion', () => {
    fc.assert(
      fc.property(anySet, (set) => {
        expect(severity(set, [], 0)).toBe(0);
      }),
      { numRuns: 100 },
    );
  });
});

const wild = fc.oneof(
  fc.double(),
  fc.constantFrom(NaN, Infinity, -Infinity, 0, -0, -1, 1e-300, 1e308, -1e308, Number.MAX_SAFE_INTEGER),
);

describe('bad input is refused, never judged', () => {
  test('any number as size, distance or count', () => {
    fc.assert(
      fc.property(anySet, finding, wild, wild, wild, wild, (set, one, sizeUm, fromCentreUm, count, times) => {
        const bad = { ...one, fromCentreUm, count, ...('sizeUm' in one ? { sizeUm } : {}) };
        const judged = judgeFace(set, [bad], times);
        const isFit =
          fromCentreUm >= 0 &&
          fromCentreUm <= 1250 &&
          Number.isInteger(count) &&
          count >= 1 &&
          count <= 1000 &&
          (!('sizeUm' in one) || (sizeUm >= 0.01 && sizeUm <= 1000));
        const isTimesFit = Number.isInteger(times) && times >= 0 && times <= 100;
        expect(judged.ok).toBe(isFit && isTimesFit);
        if (!judged.ok) expect(judged.error.code).toBe(isTimesFit ? 'finding unfit' : 'cleanings unfit');
      }),
      runs,
    );
  });

  test('any number as a reading of geometry', () => {
    const fields = Object.keys(geometryTyping) as GeometryField[];
    fc.assert(
      fc.property(
        fc.constantFrom(...shippedGeometryLimits),
        fc.constantFrom(...fields),
        wild,
        (limits, field, value) => {
          const judged = judgeGeometry(limits, { [field]: value });
          const { lowest, highest } = geometryTyping[field].possible;
          const isAsked = limits.angled !== null || !['angleDeg', 'keyErrorDeg'].includes(field);
          expect(judged.ok).toBe(isAsked && value >= lowest && value <= highest);
          if (!judged.ok) expect(judged.error).toMatchObject({ field });
        },
      ),
      runs,
    );
  });
});

describe('geometry', () => {
  const height = fc.double({ min: -300, max: 200, noNaN: true });
  const radius = fc.double({ min: 1, max: 40, noNaN: true });

  test('passes a height exactly where the radius is in range and -U(R) <= height <= +P', () => {
    const [pc] = shippedGeometryLimits;
    fc.assert(
      fc.property(radius, height, (radiusMm, fibreHeightNm) => {
        const deepest = -0.02 * radiusMm ** 3 + 1.3 * radiusMm ** 2 - 31 * radiusMm + 325;
        fc.pre(Math.abs(fibreHeightNm + deepest) > 1e-5);
        const isGood = radiusMm >= 10 && radiusMm <= 25 && fibreHeightNm >= -deepest && fibreHeightNm <= 50;
        const judged = valueOf(judgeGeometry(pc!, { radiusMm, fibreHeightNm, apexOffsetUm: 0 }));
        expect(judged.verdict).toBe(isGood ? 'pass' : 'fail');
      }),
      runs,
    );
  });
});
