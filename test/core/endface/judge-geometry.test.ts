import { describe, expect, test } from 'vitest';
import { limitsProblems } from '../../../src/core/endface/check-limits.ts';
import { diagnoseGeometry } from '../../../src/core/endface/diagnose.ts';
import type { GeometryLimits } from '../../../src/core/endface/geometry-limits.ts';
import { judgeGeometry, type GeometryReadings } from '../../../src/core/endface/judge-geometry.ts';
import { shippedGeometryLimits } from '../../../src/core/endface/shipped-limits.ts';
import { confirmLimits, shopLimits } from '../../../src/core/endface/shop-limits.ts';
import { refusalOf, valueOf } from '../optics/value-of.ts';

const limitsOf = (id: string): GeometryLimits => shippedGeometryLimits.find((limits) => limits.id === id)!;
const pc = limitsOf('pc-2-5');
const apc = limitsOf('apc-8');
const goodPc = { radiusMm: 15, apexOffsetUm: 20, fibreHeightNm: -20 };
const goodApc = { radiusMm: 8, apexOffsetUm: 20, fibreHeightNm: 0, angleDeg: 8, keyErrorDeg: 0 };
const judge = (limits: GeometryLimits, readings: GeometryReadings) => valueOf(judgeGeometry(limits, readings));
const by = { by: 'QA', at: { log: 'log', bench: 1000, wall: 1000 } };

describe('geometry', () => {
  test.each([
    [pc, goodPc, 'pass'],
    [pc, { ...goodPc, radiusMm: 10 }, 'pass'],
    [pc, { ...goodPc, radiusMm: 9.999 }, 'fail'],
    [pc, { ...goodPc, radiusMm: 25 }, 'pass'],
    [pc, { ...goodPc, radiusMm: 25.001 }, 'fail'],
    [pc, { ...goodPc, apexOffsetUm: 50 }, 'pass'],
    [pc, { ...goodPc, apexOffsetUm: 50.001 }, 'fail'],
    [apc, goodApc, 'pass'],
    [apc, { ...goodApc, fibreHeightNm: -100 }, 'pass'],
    [apc, { ...goodApc, fibreHeightNm: -100.001 }, 'fail'],
    [apc, { ...goodApc, fibreHeightNm: 100 }, 'pass'],
    [apc, { ...goodApc, fibreHeightNm: 100.001 }, 'fail'],
    [apc, { ...goodApc, angleDeg: 7.8 }, 'pass'],
    [apc, { ...goodApc, angleDeg: 8.2 }, 'pass'],
    [apc, { ...goodApc, angleDeg: 7.799 }, 'fail'],
    [apc, { ...goodApc, angleDeg: 8.201 }, 'fail'],
    [apc, { ...goodApc, keyErrorDeg: -0.5 }, 'pass'],
    [apc, { ...goodApc, keyErrorDeg: 0.501 }, 'fail'],
  ] as const)('%o', (limits, readings, verdict) => expect(judge(limits, readings).verdict).toBe(verdict));

  test('is open while something is missing, and fails as soon as something is out', () => {
    expect(judge(pc, {})).toMatchObject({ verdict: 'open', missing: ['radiusMm', 'apexOffsetUm', 'fibreHeightNm'] });
    expect(judge(pc, { apexOffsetUm: 10 }).verdict).toBe('open');
    expect(judge(pc, { apexOffsetUm: 60 }).verdict).toBe('fail');
  });

  test.each([
    [-10, 'waits for the radius'],
    [0, 'within'],
    [50, 'within'],
    [50.1, 'above'],
  ])('height %d nm before the radius is known: %s', (fibreHeightNm, tells) => {
    expect(judge(pc, { fibreHeightNm }).checks).toMatchObject([{ field: 'fibreHeightNm', tells }]);
  });

  test.each([
    [9.9, -10, 'radius out of range'],
    [100, -10, 'radius out of range'],
    [9.9, 60, 'above'],
  ])('radius %d mm fails first; height %d nm: %s', (radiusMm, fibreHeightNm, tells) => {
    const judged = judge(pc, { ...goodPc, radiusMm, fibreHeightNm });
    expect(judged.verdict).toBe('fail');
    expect(judged.checks[2]).toMatchObject({ field: 'fibreHeightNm', tells });
  });

  test('a limit that does not go by the radius is judged without it', () => {
    expect(judge(apc, { fibreHeightNm: -101 }).verdict).toBe('fail');
  });

  test('a radius of 3 m is asked about', () => {
    expect(judge(pc, { radiusMm: 3000 }).checks).toMatchObject([{ typed: 'unusual', tells: 'above' }]);
    expect(judge(pc, { radiusMm: 15 }).checks).toMatchObject([{ typed: 'usual' }]);
  });

  test('a square end has no angle', () => {
    expect(refusalOf(judgeGeometry(pc, { angleDeg: 8 }))).toEqual({ code: 'not in these limits', field: 'angleDeg' });
  });

  test.each([
    [{ radiusMm: NaN }, 'not a number'],
    [{ radiusMm: 0 }, 'out of range'],
    [{ radiusMm: 1e9 }, 'out of range'],
    [{ apexOffsetUm: -1 }, 'out of range'],
    [{ fibreHeightNm: -1e9 }, 'out of range'],
    [{ fibreHeightNm: Infinity }, 'not a number'],
    [{ angleDeg: -8 }, 'out of range'],
    [{ keyErrorDeg: 181 }, 'out of range'],
  ])('%o is refused', (readings, code) => expect(refusalOf(judgeGeometry(apc, readings)).code).toBe(code));
});

describe('what geometry usually means', () => {
  const codes = (limits: GeometryLimits, readings: GeometryReadings) =>
    diagnoseGeometry(judge(limits, readings).checks).map(({ code }) => code);

  test.each([
    [pc, { ...goodPc, radiusMm: 5 }, ['radius-low']],
    [pc, { ...goodPc, radiusMm: 40 }, ['radius-high']],
    [pc, { ...goodPc, fibreHeightNm: -200 }, ['undercut']],
    [pc, { ...goodPc, fibreHeightNm: 60, apexOffsetUm: 90 }, ['apex', 'protrusion']],
    [apc, { ...goodApc, angleDeg: 7, keyErrorDeg: 2 }, ['angle']],
    [pc, goodPc, []],
  ] as const)('%o', (limits, readings, expected) => expect(codes(limits, readings)).toEqual(expected));
});

describe('limits', () => {
  test.each(shippedGeometryLimits.map((limits) => [limits.id, limits] as const))('%s are sound', (_id, limits) => {
    expect(limitsProblems(limits)).toEqual([]);
  });

  test('of the shop’s own are answered for, and those from memory can be confirmed', () => {
    const own = valueOf(shopLimits({ ...apc, id: 'own', name: 'Own', mostApexOffsetUm: 30 }, by));
    expect(judge(own, { apexOffsetUm: 31 })).toMatchObject({ verdict: 'fail', limits: { unconfirmed: false } });
    expect(judge(valueOf(confirmLimits(pc, by)), {}).limits.unconfirmed).toBe(false);
    expect(refusalOf(shopLimits(apc, by))).toEqual({ code: 'limits exist', id: 'apc-8' });
    expect(refusalOf(shopLimits({ ...apc, id: 'own' }, { ...by, by: '' }))).toEqual({ code: 'name missing' });
  });

  const own = { ...pc, id: 'own', name: 'Own' };
  test.each([
    [{ ...own, id: '' }, 'text unfit'],
    [{ ...own, name: '' }, 'text unfit'],
    [{ ...own, ferrulesMm: [] }, 'ferrule unfit'],
    [{ ...own, ferrulesMm: [NaN] }, 'ferrule unfit'],
    [{ ...own, radiusMm: { lowest: 25, highest: 10 } }, 'radius unfit'],
    [{ ...own, radiusMm: { lowest: NaN, highest: 10 } }, 'radius unfit'],
    [{ ...own, mostApexOffsetUm: -1 }, 'limit unfit'],
    [{ ...own, mostProtrusionNm: NaN }, 'limit unfit'],
    [{ ...own, angled: apc.angled }, 'angle without polish'],
    [{ ...apc, id: 'own', angled: { angleDeg: 8, toleranceDeg: NaN, mostKeyErrorDeg: 1 } }, 'limit unfit'],
    [{ ...own, radiusMm: { lowest: 10, highest: 100 } }, 'undercut unfit'],
    [{ ...own, undercut: { kind: 'fixed', mostNm: -1 } }, 'undercut unfit'],
  ] as const)('are refused: %o', (draft, code) => {
    const refused = refusalOf(shopLimits(draft, by));
    expect(refused.code === 'limits unfit' ? refused.problems.map((problem) => problem.code) : []).toContain(code);
    expect(refusalOf(judgeGeometry(draft, {})).code).toBe('limits unfit');
  });
});
