import { describe, expect, test } from 'vitest';
import { maximumAcceptableLossDb, type Parts } from '../../src/core/optics/budget.ts';
import { componentLosses, type Light } from '../../src/core/optics/component-losses.ts';
import { judgeAssembly, judgeLink, type Look, type MeasuredLoss } from '../../src/core/optics/judge-loss.ts';
import { lossFromReadings, takeLoss } from '../../src/core/optics/readings.ts';
import { refusalOf, valueOf } from '../core/optics/value-of.ts';

const parts = (lengthM: number, matedPairs: number, tunedSplices = 0, untunedSplices = 0): Parts => ({
  lengthM,
  matedPairs,
  tunedSplices,
  untunedSplices,
});
const single: Extract<Light, { fibre: 'single-mode' }> = { fibre: 'single-mode', windowNm: 1300 };
const multi: Extract<Light, { fibre: 'multimode' }> = { fibre: 'multimode', windowNm: 850 };

describe('MIL-STD-2042-6B, tables 6C1-IV and 6E1-IV', () => {
  test('mated pair 0.75 dB; splice 0.2 dB tuned, 0.6 dB untuned; cable 1.5, 1.5, 4.5, 2.0 dB/km', () => {
    expect(componentLosses).toMatchObject({
      matedPairDb: 0.75,
      tunedSpliceDb: 0.2,
      untunedSpliceDb: 0.6,
      cableDbPerKm: { 'single-mode': { 1300: 1.5, 1550: 1.5 }, multimode: { 850: 4.5, 1300: 2 } },
    });
    expect(componentLosses.basis.rests).toBe('published');
  });

  const budgets: readonly (readonly [string, Light, Parts, number])[] = [
    ['single-mode, 50 m, 2 connectors', single, parts(50, 2), 1.575],
    ['multimode 850 nm, 100 m, 3 connectors, 1 tuned splice', multi, parts(100, 3, 1), 2.9],
    [
      'multimode 1300 nm, 200 m, 2 connectors, 1 untuned splice',
      { fibre: 'multimode', windowNm: 1300 },
      parts(200, 2, 0, 1),
      2.5,
    ],
  ];
  test.each(budgets)('MAL, %s: %d dB (computed from the tables)', (_name, light, listed, lossDb) => {
    expect(valueOf(maximumAcceptableLossDb(light, listed))).toBe(lossDb);
  });

  test('6E1 notes: the actual cable counts where it loses more; other components are added', () => {
    expect(valueOf(maximumAcceptableLossDb(single, { ...parts(1000, 0), actualCableDbPerKm: 2 }))).toBe(2);
    expect(valueOf(maximumAcceptableLossDb(single, { ...parts(1000, 0), actualCableDbPerKm: 1 }))).toBe(1.5);
    const others = [{ name: 'switch', count: 2, eachDb: 1.2 }];
    expect(valueOf(maximumAcceptableLossDb(single, { ...parts(0, 1), others }))).toBe(3.15);
  });
});

const onOne = (lossDb: number): MeasuredLoss => ({ light: single, lossDb });
const onBoth = (lossAToBDb: number, lossBToADb: number): MeasuredLoss => ({ light: multi, lossAToBDb, lossBToADb });

describe('MIL-STD-2042-6B, method 6C1, 3.3.2: cable assembly, MAL 1.575 dB', () => {
  const judge = (measured: MeasuredLoss, look: Look = 'first', supplierLossDb: number | null = null) =>
    valueOf(judgeAssembly({ measured, parts: parts(50, 2), occasion: { kind: 'acceptance', supplierLossDb }, look }));

  test.each([
    [0, 'accept'],
    [1.574, 'accept'],
    [1.575, 'accept'],
    [1.576, 'clean and retest'],
    [2.074, 'clean and retest'],
    [2.075, 'reject'],
    [2.076, 'reject'],
  ] as const)('first look, %d dB: %s', (lossDb, verdict) => {
    expect(judge(onOne(lossDb))).toMatchObject({ verdict, limitDb: 1.575, marginDb: 0.5 });
  });

  test.each([
    [1.575, 'accept'],
    [1.576, 'reterminate or replace'],
    [2.074, 'reterminate or replace'],
    [2.075, 'reject'],
  ] as const)('after cleaning, %d dB: %s', (lossDb, verdict) => {
    expect(judge(onOne(lossDb), 'after cleaning').verdict).toBe(verdict);
  });

  test.each([
    [1.9, 2, 'accept', 'at most the loss that the supplier states'],
    [2, 2, 'accept', 'at most the loss that the supplier states'],
    [2.01, 2, 'clean and retest', 'above the maximum by less than the margin'],
    [1.2, 1, 'accept', 'at most the maximum acceptable loss'],
  ] as const)('at acceptance, %d dB where the supplier says %d dB: %s, %s', (lossDb, supplierDb, verdict, rule) => {
    expect(judge(onOne(lossDb), 'first', supplierDb)).toMatchObject({ verdict, rule });
  });

  test('at installation the supplier’s loss is not asked', () => {
    const occasion = { kind: 'installation' } as const;
    const judged = judgeAssembly({ measured: onOne(1.9), parts: parts(50, 2), occasion, look: 'first' });
    expect(valueOf(judged).verdict).toBe('clean and retest');
  });

  test.each([
    [1.95, 1.95, 'accept', 'A to B'],
    [1.5, 1.96, 'clean and retest', 'B to A'],
    [2.45, 1.5, 'reject', 'A to B'],
  ] as const)('multimode, MAL 1.95 dB, %d and %d dB: %s, %s decides', (there, back, verdict, direction) => {
    const judged = judgeAssembly({
      measured: onBoth(there, back),
      parts: parts(100, 2),
      occasion: { kind: 'installation' },
      look: 'first',
    });
    expect(valueOf(judged)).toMatchObject({ verdict, direction, lossDb: Math.max(there, back) });
  });
});

describe('MIL-STD-2042-6B, method 6E1, 3.3.2: link', () => {
  const judge = (lossDb: number, look: Look = 'first') =>
    valueOf(judgeLink({ measured: onOne(lossDb), limit: { kind: 'computed', parts: parts(50, 2) }, look }));

  test.each([
    [1.575, 'accept'],
    [1.576, 'clean and retest'],
    [2.075, 'clean and retest'],
    [2.574, 'clean and retest'],
    [2.575, 'reject'],
    [2.576, 'reject'],
  ] as const)('first look, %d dB: %s', (lossDb, verdict) => {
    expect(judge(lossDb)).toMatchObject({ verdict, limitDb: 1.575, marginDb: 1 });
  });

  test('still high after cleaning is reterminated (as 6C1: the end of this sentence was not seen)', () => {
    expect(judge(2, 'after cleaning').verdict).toBe('reterminate or replace');
  });

  test('an unknown length is zero', () => {
    const limit = { kind: 'computed', parts: { ...parts(0, 2), lengthM: 'unknown' } } as const;
    expect(valueOf(judgeLink({ measured: onOne(1.5), limit, look: 'first' })).limitDb).toBe(1.5);
  });

  test('a specified loss comes before the budget', () => {
    const limit = { kind: 'specified', specifiedLossDb: 3 } as const;
    expect(valueOf(judgeLink({ measured: onOne(3), limit, look: 'first' })).verdict).toBe('accept');
    expect(valueOf(judgeLink({ measured: onOne(4), limit, look: 'first' })).verdict).toBe('reject');
  });

  test('multimode: the higher direction decides', () => {
    const limit = { kind: 'computed', parts: parts(100, 3, 1) } as const;
    const judged = valueOf(judgeLink({ measured: onBoth(2.9, 2.91), limit, look: 'first' }));
    expect(judged).toMatchObject({ verdict: 'clean and retest', direction: 'B to A', limitDb: 2.9 });
  });
});

describe('MIL-STD-2042-6B: loss is reference power less test power, and never a gain', () => {
  test.each([
    [-20, -21.575, 1.575],
    [-18.2, -18.2, 0],
    [-3.07, -4.14, 1.07],
  ])('%d dBm and %d dBm: %d dB, to the last digit', (referencePowerDbm, testPowerDbm, lossDb) => {
    expect(valueOf(lossFromReadings({ referencePowerDbm, testPowerDbm })).lossDb).toBe(lossDb);
  });

  test('more power with the cable than without: reference again', () => {
    const refused = refusalOf(lossFromReadings({ referencePowerDbm: -20, testPowerDbm: -19.99 }));
    expect(refused).toEqual({ code: 'reference again', lossDb: -0.01 });
    expect(refusalOf(takeLoss(-0.01)).code).toBe('reference again');
    const occasion = { kind: 'installation' } as const;
    const judged = judgeAssembly({ measured: onBoth(0.2, -0.1), parts: parts(0, 1), occasion, look: 'first' });
    expect(refusalOf(judged).code).toBe('reference again');
  });
});
