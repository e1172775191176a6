import { describe, expect, test } from 'vitest';
import { explainMultimodeLoss, explainSingleModeLoss } from '../../../src/core/optics/explain-loss.ts';
import { explainReturnLoss } from '../../../src/core/optics/explain-return-loss.ts';
import type { MultimodeFibre, SingleModeFibre } from '../../../src/core/optics/fibre.ts';
import { singleModeJointLosses, type SingleModeJoint } from '../../../src/core/optics/joint-losses.ts';
import { multimodeJointLosses } from '../../../src/core/optics/multimode-joint-losses.ts';
import { refusalOf, valueOf } from './value-of.ts';

const fibre: SingleModeFibre = { kind: 'single-mode', modeFieldUm: 9.2, wavelengthNm: 1310, glassIndex: 1.468 };
const aligned: SingleModeJoint = {
  firstModeFieldUm: 9.2,
  secondModeFieldUm: 9.2,
  wavelengthNm: 1310,
  glassIndex: 1.468,
  mediumIndex: 1,
  offsetUm: 0,
  tiltDeg: 0,
  gapUm: 0,
};
const multimode: MultimodeFibre = {
  kind: 'multimode',
  coreUm: 50,
  numericalAperture: 0.2,
  glassIndex: 1.48,
  profile: { kind: 'step' },
};

describe('what would explain a single-mode loss', () => {
  test('0.25 dB is about 1.1 µm off at a mode field of 9.2 µm (computed)', () => {
    const causes = valueOf(explainSingleModeLoss(0.25, fibre));
    expect(causes.offsetUm).toBeCloseTo(1.1, 1);
    expect(causes).toMatchObject({ airGapUm: null, suggests: 'offset alone may do it' });
    expect(causes.leastAirGapLossDb).toBeCloseTo(0.318, 3);
  });

  test('no loss asks for no cause', () => {
    const causes = valueOf(explainSingleModeLoss(0, fibre));
    expect(causes).toMatchObject({ offsetUm: 0, tiltDeg: 0, narrowerModeFieldUm: 9.2, widerModeFieldUm: 9.2 });
  });

  test.each([
    [0.499, 'offset alone may do it'],
    [0.5, 'dirt, a gap or another fibre'],
  ])('%d dB suggests: %s', (lossDb, suggests) => {
    expect(valueOf(explainSingleModeLoss(lossDb, fibre)).suggests).toBe(suggests);
  });

  test('each cause alone gives the loss again', () => {
    const causes = valueOf(explainSingleModeLoss(0.8, fibre));
    const total = (joint: Partial<SingleModeJoint>) => valueOf(singleModeJointLosses({ ...aligned, ...joint })).totalDb;
    expect(total({ offsetUm: causes.offsetUm })).toBeCloseTo(0.8, 9);
    expect(total({ tiltDeg: causes.tiltDeg })).toBeCloseTo(0.8, 9);
    expect(total({ gapUm: causes.airGapUm ?? 0 })).toBeCloseTo(0.8, 9);
    expect(total({ secondModeFieldUm: causes.narrowerModeFieldUm })).toBeCloseTo(0.8, 9);
    expect(total({ firstModeFieldUm: causes.widerModeFieldUm })).toBeCloseTo(0.8, 9);
  });
});

describe('losses of a joint', () => {
  test('add in dB; the faces of a gap count once; contact has none', () => {
    const all = valueOf(
      singleModeJointLosses({ ...aligned, secondModeFieldUm: 10.4, offsetUm: 1, tiltDeg: 0.3, gapUm: 10 }),
    );
    const { totalDb, ...each } = all;
    expect(Object.values(each).reduce((sum, db) => sum + db, 0)).toBeCloseTo(totalDb, 12);
    expect(Object.values(each).every((db) => db > 0)).toBe(true);
    expect(valueOf(singleModeJointLosses(aligned)).totalDb).toBe(0);
  });

  test('unequal spots: tilt by the overlap of both fields, spelt out', () => {
    const joint = { ...aligned, secondModeFieldUm: 10.4, tiltDeg: 0.5 };
    const [first, second] = [4.6, 5.2];
    const wave = (2 * Math.PI * 1.468) / 1.31;
    const exponent = ((wave * 0.5 * Math.PI) / 180) ** 2 / (2 * (1 / first ** 2 + 1 / second ** 2));
    expect(valueOf(singleModeJointLosses(joint)).tiltDb).toBeCloseTo((10 / Math.LN10) * exponent, 9);
  });

  test('multimode cores that no longer overlap let nothing through', () => {
    const joint = { fibre: multimode, between: { kind: 'contact' }, offsetUm: 50, tiltDeg: 0 } as const;
    expect(valueOf(multimodeJointLosses(joint)).totalDb).toBe(Infinity);
  });

  test.each([
    [5, 'taken'],
    [5.01, 'refused'],
  ])('graded index: %d µm off a core radius of 25 µm is %s', (offsetUm, told) => {
    const graded: MultimodeFibre = { ...multimode, profile: { kind: 'graded', modes: 'guided' } };
    const losses = multimodeJointLosses({ fibre: graded, between: { kind: 'contact' }, offsetUm, tiltDeg: 0 });
    expect(losses.ok ? 'taken' : 'refused').toBe(told);
    if (!losses.ok) expect(losses.error).toMatchObject({ code: 'out of range', field: 'offsetUm', highest: 5 });
  });

  test('a tilt past the cone is refused', () => {
    const joint = { fibre: multimode, between: { kind: 'gap', mediumIndex: 1 }, offsetUm: 0, tiltDeg: 12 } as const;
    expect(refusalOf(multimodeJointLosses(joint))).toMatchObject({ code: 'out of range', field: 'tiltDeg' });
  });
});

describe('what would explain a multimode loss', () => {
  test('62.5 µm into 50 µm loses 1.94 dB (computed)', () => {
    const causes = valueOf(explainMultimodeLoss(1.9382, { ...multimode, coreUm: 62.5 }));
    expect(causes.narrowerCoreUm).toBeCloseTo(50, 3);
  });

  test('the graded formula ends at a fifth of the core radius', () => {
    const graded: MultimodeFibre = { ...multimode, profile: { kind: 'graded', modes: 'guided' } };
    expect(valueOf(explainMultimodeLoss(0.809, graded)).offsetUm).toBeCloseTo(5, 2);
    expect(valueOf(explainMultimodeLoss(0.81, graded)).offsetUm).toBeNull();
  });

  test('the angular formula ends at the cone', () => {
    expect(valueOf(explainMultimodeLoss(1.5, multimode)).tiltDeg).not.toBeNull();
    expect(valueOf(explainMultimodeLoss(2, multimode)).tiltDeg).toBeNull();
  });
});

describe('what a return loss points to', () => {
  test.each([
    [5, 'stronger than any air gap'],
    [11.4, 'air gap, no contact'],
    [10.5, 'air gap, no contact'],
    [14.5, 'open end'],
    [12.9, 'no level of its own'],
    [9.5, 'no level of its own'],
    [45, 'no level of its own'],
    [75, 'no level of its own'],
    [76, 'at the instrument floor'],
  ])('%d dB: %s', (returnLossDb, meaning) => {
    expect(valueOf(explainReturnLoss(returnLossDb, fibre, 0)).meaning).toBe(meaning);
  });

  test('an open 8° face is expected at 103 dB in theory', () => {
    expect(valueOf(explainReturnLoss(60, fibre, 8)).levels.angledEndDb).toBeCloseTo(103.3, 1);
  });

  test.each([NaN, -45, 121])('%d dB is refused', (returnLossDb) => {
    expect(refusalOf(explainReturnLoss(returnLossDb, fibre, 0))).toMatchObject({ field: 'returnLossDb' });
  });
});
