import { describe, expect, test } from 'vitest';
import { isUnconfirmed } from '../../src/core/unit/basis.ts';
import { lossGrades, returnLossGrades, tellLossGrades, tellReturnLossGrades } from '../../src/core/optics/grades.ts';
import { valueOf } from '../core/optics/value-of.ts';

/** IEC 61753-1 and 61755-1, random mating: from memory, to be confirmed against the bought text. */
describe('IEC 61753-1 grades (from memory)', () => {
  test.each([
    ['A', 0.07, 0.15],
    ['B', 0.12, 0.25],
    ['C', 0.25, 0.5],
    ['D', 0.5, 1],
  ])('grade %s: mean %d dB, 97 %% %d dB', (grade, highestMeanDb, highest97PercentDb) => {
    const found = lossGrades.find((each) => each.grade === grade);
    expect(found).toMatchObject({ highestMeanDb, highest97PercentDb, fibre: 'single-mode' });
  });

  test.each([
    ['1', 60],
    ['2', 45],
    ['3', 35],
    ['4', 26],
  ])('return loss grade %s: %d dB mated', (grade, lowestMatedDb) => {
    expect(returnLossGrades.find((each) => each.grade === grade)).toMatchObject({ lowestMatedDb });
  });

  test('grade 1 also asks for 55 dB unmated', () => {
    expect(returnLossGrades.map(({ lowestUnmatedDb }) => lowestUnmatedDb)).toEqual([55, null, null, null]);
  });

  test('multimode grades are empty until confirmed; nothing here is confirmed', () => {
    const multimode = lossGrades.filter(({ fibre }) => fibre === 'multimode');
    expect(multimode.map(({ grade }) => grade)).toEqual(['Am', 'Bm', 'Cm', 'Dm']);
    expect(multimode.every(({ highest97PercentDb }) => highest97PercentDb === null)).toBe(true);
    expect([...lossGrades, ...returnLossGrades].every(({ basis }) => isUnconfirmed(basis))).toBe(true);
  });
});

describe('a reading has no grade: it lies on one side of each grade’s limit', () => {
  const tell = (lossDb: number) => valueOf(tellLossGrades(lossDb, 'single-mode')).map(({ tells }) => tells);
  const within = 'within the 97 % limit of the grade';
  const above = 'above the 97 % limit of the grade';

  test.each([
    [0.15, [within, within, within, within]],
    [0.16, [above, within, within, within]],
    [0.25, [above, within, within, within]],
    [0.251, [above, above, within, within]],
    [1, [above, above, above, within]],
    [1.001, [above, above, above, above]],
  ])('%d dB', (lossDb, expected) => expect(tell(lossDb)).toEqual(expected));

  test('of multimode grades nothing is told', () => {
    const told = valueOf(tellLossGrades(0.2, 'multimode'));
    expect(new Set(told.map(({ tells }) => tells))).toEqual(new Set(['limit not known']));
  });

  test.each([
    [60, 4],
    [59.9, 3],
    [45, 3],
    [44.9, 2],
    [26, 1],
    [25.9, 0],
  ])('a return loss of %d dB is at least the limit of %d grades', (returnLossDb, count) => {
    const told = valueOf(tellReturnLossGrades(returnLossDb));
    expect(told.filter(({ tells }) => tells === 'at least the limit of the grade')).toHaveLength(count);
  });
});
