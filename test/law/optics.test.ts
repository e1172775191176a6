import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { maximumAcceptableLossDb } from '../../src/core/optics/budget.ts';
import {
  lossDbOfLost,
  lossDbOfShare,
  lostOfLossDb,
  shareOfLossDb,
  totalLossDb,
} from '../../src/core/optics/decibels.ts';
import { explainMultimodeLoss, explainSingleModeLoss } from '../../src/core/optics/explain-loss.ts';
import { explainReturnLoss } from '../../src/core/optics/explain-return-loss.ts';
import { angledReturnLossDb, angleRadForReturnLoss } from '../../src/core/optics/fresnel.ts';
import { tellLossGrades } from '../../src/core/optics/grades.ts';
import { singleModeJointLosses } from '../../src/core/optics/joint-losses.ts';
import { judgeAssembly, judgeLink, lossSeverity, type MeasuredLoss } from '../../src/core/optics/judge-loss.ts';
import { angularLossDb, gradedOffsetLossDb, stepOffsetLossDb } from '../../src/core/optics/multimode.ts';
import {
  gradedOffsetUmForLoss,
  stepOffsetUmForLoss,
  tiltRadForAngularLoss,
} from '../../src/core/optics/multimode-inverse.ts';
import { multimodeJointLosses } from '../../src/core/optics/multimode-joint-losses.ts';
import { lossFromReadings, takeLoss, takeReturnLoss } from '../../src/core/optics/readings.ts';
import { gapLossDb, mismatchLossDb, offsetLossDb, tiltLossDb } from '../../src/core/optics/single-mode.ts';
import {
  gapUmForLoss,
  offsetUmForLoss,
  spotRatioForLoss,
  tiltRadForLoss,
} from '../../src/core/optics/single-mode-inverse.ts';
import { valueOf } from '../core/optics/value-of.ts';

const runs = { numRuns: 500 };
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const spots = fc.record({ firstSpotRadiusUm: between(1, 15), secondSpotRadiusUm: between(1, 15) });
const beam = fc.record({ spotRadiusUm: between(1, 15), wavelengthNm: between(600, 1700), indexBetween: between(1, 2) });
const near = (found: number | null, expected: number): void => {
  expect(found).not.toBeNull();
  expect(Math.abs((found ?? NaN) - expected)).toBeLessThanOrEqual(1e-9);
};

describe('there and back within 1e-9, single-mode', () => {
  test('loss from offset, offset from loss', () => {
    fc.assert(
      fc.property(spots, between(0, 20), (pair, offsetUm) => {
        near(offsetUmForLoss(offsetLossDb(offsetUm, pair), pair), offsetUm);
      }),
      runs,
    );
  });

  test('loss from tilt, tilt from loss', () => {
    fc.assert(
      fc.property(beam, between(0, 0.2), (light, tiltRad) => {
        near(tiltRadForLoss(tiltLossDb(tiltRad, light), light), tiltRad);
      }),
      runs,
    );
  });

  test('loss from gap, gap from loss, loss again', () => {
    fc.assert(
      fc.property(beam, between(0, 1000), (light, gapUm) => {
        const lossDb = gapLossDb(gapUm, light);
        near(gapLossDb(gapUmForLoss(lossDb, light), light), lossDb);
        near(gapUmForLoss(lossDb, light), gapUm);
      }),
      runs,
    );
  });

  test('mismatch from loss, loss from mismatch, wider and narrower alike', () => {
    fc.assert(
      fc.property(between(1, 15), between(0, 40), (firstSpotRadiusUm, lossDb) => {
        const ratio = spotRatioForLoss(lossDb);
        near(mismatchLossDb({ firstSpotRadiusUm, secondSpotRadiusUm: firstSpotRadiusUm * ratio }), lossDb);
        near(mismatchLossDb({ firstSpotRadiusUm, secondSpotRadiusUm: firstSpotRadiusUm / ratio }), lossDb);
      }),
      runs,
    );
  });

  test('return loss from angle, angle from return loss', () => {
    const face = { glassIndex: 1.468, mediumIndex: 1, spotRadiusUm: 4.6, wavelengthNm: 1310 };
    fc.assert(
      fc.property(between(0.001, 0.25), (angleRad) => {
        near(angleRadForReturnLoss(angledReturnLossDb(angleRad, face), face), angleRad);
      }),
      runs,
    );
    expect(angleRadForReturnLoss(10, face)).toBeNull();
  });
});

describe('there and back within 1e-9, multimode', () => {
  test('step index: loss from offset, offset from loss, loss again', () => {
    fc.assert(
      fc.property(between(5, 100), between(0, 1.9), (coreRadiusUm, share) => {
        const lossDb = stepOffsetLossDb(share * coreRadiusUm, coreRadiusUm);
        const offsetUm = stepOffsetUmForLoss(lossDb, coreRadiusUm);
        near(offsetUm, share * coreRadiusUm);
        near(stepOffsetLossDb(offsetUm, coreRadiusUm), lossDb);
      }),
      runs,
    );
  });

  test('graded index, over all that its formula covers', () => {
    fc.assert(
      fc.property(
        between(5, 100),
        between(0, 0.2),
        fc.constantFrom('guided', 'guided and leaky'),
        (radiusUm, share, modes) => {
          const lossDb = gradedOffsetLossDb(share * radiusUm, radiusUm, modes);
          near(gradedOffsetUmForLoss(lossDb, radiusUm, modes), share * radiusUm);
        },
      ),
      runs,
    );
  });

  test('tilt, over all that its formula covers', () => {
    fc.assert(
      fc.property(between(1, 2), between(0.05, 0.6), between(0, 1), (index, aperture, share) => {
        const tiltRad = (share * aperture) / index;
        near(tiltRadForAngularLoss(angularLossDb(tiltRad, index, aperture), index, aperture), tiltRad);
      }),
      runs,
    );
  });
});

describe('losses', () => {
  test('add in dB as shares multiply, in any order', () => {
    fc.assert(
      fc.property(fc.array(between(0, 10), { maxLength: 8 }), (lossesDb) => {
        const share = lossesDb.reduce((product, lossDb) => product * shareOfLossDb(lossDb), 1);
        near(totalLossDb(lossesDb), lossDbOfShare(share));
        near(totalLossDb(lossesDb.toReversed()), totalLossDb(lossesDb));
      }),
      runs,
    );
  });

  test('of a share and of what is lost agree', () => {
    fc.assert(
      fc.property(between(0, 60), (lossDb) => {
        near(lossDbOfShare(shareOfLossDb(lossDb)), lossDb);
        near(lossDbOfLost(lostOfLossDb(lossDb)), lossDb);
      }),
      runs,
    );
  });

  test('of a joint in contact are those of its parts added, and none falls as its cause grows', () => {
    const joint = fc.record({
      firstModeFieldUm: between(4, 15),
      secondModeFieldUm: between(4, 15),
      wavelengthNm: between(800, 1700),
      glassIndex: between(1.4, 1.6),
      mediumIndex: fc.constant(1),
      offsetUm: between(0, 5),
      tiltDeg: between(0, 2),
      gapUm: between(0, 50),
    });
    fc.assert(
      fc.property(joint, between(0, 3), (one, more) => {
        const losses = valueOf(singleModeJointLosses(one));
        const { mismatchDb, offsetDb, tiltDb, gapDb, facesDb, totalDb } = losses;
        near(totalDb, mismatchDb + offsetDb + tiltDb + gapDb + facesDb);
        for (const change of [
          { offsetUm: one.offsetUm + more },
          { tiltDeg: one.tiltDeg + more },
          { gapUm: one.gapUm + more },
        ]) {
          // From contact to a gap the light tilts in another medium, so only like is compared with like.
          if (one.gapUm === 0 && 'gapUm' in change) continue;
          const worse = valueOf(singleModeJointLosses({ ...one, ...change }));
          expect(worse.totalDb).toBeGreaterThanOrEqual(totalDb - 1e-12);
        }
      }),
      runs,
    );
  });

  test('from two readings of a hundredth are exact to the hundredth', () => {
    const hundredths = fc.integer({ min: -6000, max: 1000 });
    fc.assert(
      fc.property(hundredths, fc.integer({ min: 0, max: 4000 }), (reference, loss) => {
        const readings = { referencePowerDbm: reference / 100, testPowerDbm: (reference - loss) / 100 };
        expect(valueOf(lossFromReadings(readings)).lossDb).toBe(loss / 100);
      }),
      runs,
    );
  });
});

const single = (lossDb: number): MeasuredLoss => ({ light: { fibre: 'single-mode', windowNm: 1300 }, lossDb });
const parts = fc.record({
  lengthM: fc.integer({ min: 0, max: 20_000 }),
  matedPairs: fc.integer({ min: 0, max: 12 }),
  tunedSplices: fc.integer({ min: 0, max: 12 }),
  untunedSplices: fc.integer({ min: 0, max: 12 }),
});
const look = fc.constantFrom('first' as const, 'after cleaning' as const);

describe('verdict of a loss (MIL-STD-2042-6B)', () => {
  test.each([
    ['assembly', 0.5],
    ['link', 1],
  ] as const)('%s: every boundary lands on the documented side, whatever the budget', (what, marginDb) => {
    fc.assert(
      fc.property(parts, look, (listed, at) => {
        const verdictAt = (lossDb: number) =>
          what === 'assembly'
            ? judgeAssembly({ measured: single(lossDb), parts: listed, occasion: { kind: 'installation' }, look: at })
            : judgeLink({ measured: single(lossDb), limit: { kind: 'computed', parts: listed }, look: at });
        const maximumDb = valueOf(maximumAcceptableLossDb({ fibre: 'single-mode', windowNm: 1300 }, listed));
        const doubtful = at === 'first' ? 'clean and retest' : 'reterminate or replace';
        expect(valueOf(verdictAt(maximumDb)).verdict).toBe('accept');
        expect(valueOf(verdictAt(maximumDb + 0.001)).verdict).toBe(doubtful);
        expect(valueOf(verdictAt(maximumDb + marginDb - 0.001)).verdict).toBe(doubtful);
        expect(valueOf(verdictAt(maximumDb + marginDb)).verdict).toBe('reject');
      }),
      runs,
    );
  });

  test('never gets better as the loss grows, and multimode is as bad as its worse direction', () => {
    fc.assert(
      fc.property(parts, look, between(0, 40), between(0, 40), (listed, at, a, b) => {
        const judge = (measured: MeasuredLoss) =>
          lossSeverity[
            valueOf(judgeAssembly({ measured, parts: listed, occasion: { kind: 'installation' }, look: at })).verdict
          ];
        expect(judge(single(Math.max(a, b)))).toBeGreaterThanOrEqual(judge(single(Math.min(a, b))));
        const both = (lossAToBDb: number, lossBToADb: number): MeasuredLoss => ({
          light: { fibre: 'multimode', windowNm: 850 },
          lossAToBDb,
          lossBToADb,
        });
        expect(judge(both(a, b))).toBe(Math.max(judge(both(a, a)), judge(both(b, b))));
      }),
      runs,
    );
  });
});

const wild = fc.oneof(
  fc.double(),
  fc.constantFrom(NaN, Infinity, -Infinity, 0, -0, -1, 1e-300, 1e308, -1e308, 0.5, 1.5),
);

describe('bad input is refused by code and field, never computed with', () => {
  const kinds = ['not a number', 'not whole', 'out of range', 'reference again'];
  const fit = (result: { ok: true; value: unknown } | { ok: false; error: { code: string } }, ...inputs: number[]) => {
    if (!result.ok) expect(kinds).toContain(result.error.code);
    else expect(inputs.every((each) => Number.isFinite(each) && each >= 0)).toBe(true);
  };

  test('readings', () => {
    fc.assert(
      fc.property(wild, wild, (a, b) => {
        fit(takeLoss(a), Math.abs(a));
        fit(takeReturnLoss(a), Math.abs(a));
        fit(lossFromReadings({ referencePowerDbm: a, testPowerDbm: b }), Math.abs(a), Math.abs(b));
        fit(tellLossGrades(a, 'single-mode'), a);
      }),
      runs,
    );
  });

  test('budgets', () => {
    fc.assert(
      fc.property(wild, wild, wild, wild, wild, (lengthM, matedPairs, tunedSplices, untunedSplices, eachDb) => {
        const others = [{ name: 'x', count: 1, eachDb }];
        const budget = maximumAcceptableLossDb(
          { fibre: 'multimode', windowNm: 850 },
          { lengthM, matedPairs, tunedSplices, untunedSplices, others },
        );
        fit(budget, lengthM, matedPairs, tunedSplices, untunedSplices, eachDb);
      }),
      runs,
    );
  });

  test('the calculator', () => {
    fc.assert(
      fc.property(wild, wild, wild, wild, wild, (a, b, c, d, e) => {
        const fibre = { kind: 'single-mode', modeFieldUm: b, wavelengthNm: c, glassIndex: d } as const;
        fit(explainSingleModeLoss(a, fibre), a, b, c, d);
        fit(explainReturnLoss(a, fibre, e), a, b, c, d, e);
        const profile = { kind: 'step' } as const;
        const multimode = { kind: 'multimode', coreUm: b, numericalAperture: c, glassIndex: d, profile } as const;
        fit(explainMultimodeLoss(a, multimode), a, b, c, d);
        const between = { kind: 'gap', mediumIndex: e } as const;
        fit(multimodeJointLosses({ fibre: multimode, between, offsetUm: a, tiltDeg: a }), a, b, c, d, e);
      }),
      runs,
    );
  });

  test('the calculator, one wild value at a time', () => {
    const good = {
      firstModeFieldUm: 9.2,
      secondModeFieldUm: 9.2,
      wavelengthNm: 1310,
      glassIndex: 1.468,
      mediumIndex: 1,
      offsetUm: 1,
      tiltDeg: 0.5,
      gapUm: 1,
    };
    const fields = Object.keys(good) as (keyof typeof good)[];
    fc.assert(
      fc.property(fc.constantFrom(...fields), wild, (field, value) => {
        const losses = singleModeJointLosses({ ...good, [field]: value });
        if (losses.ok) expect(Number.isFinite(losses.value.totalDb)).toBe(true);
        else expect(losses.error.field).toBe(field);
      }),
      runs,
    );
  });
});
