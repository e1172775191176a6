import { isAtLeast, isAtMost } from '../unit/decimal.ts';
import { isUnconfirmed, type Basis } from '../unit/basis.ts';
import { checkNumber, type NumberRefusal } from '../unit/number-check.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import { lossTyping, returnLossTyping } from './readings.ts';

/**
 * Grades speak of a population mated at random, by its mean and its 97th percentile. One reading has no grade: all
 * that can be told of it is on which side of a grade's 97 % limit it lies.
 */
export interface LossGrade {
  readonly grade: string;
  readonly fibre: 'single-mode' | 'multimode';
  /** Null until somebody has confirmed the figure. */
  readonly highestMeanDb: number | null;
  readonly highest97PercentDb: number | null;
  readonly basis: Basis;
}

export interface ReturnLossGrade {
  readonly grade: string;
  readonly lowestMatedDb: number;
  /** Of an open end, where the grade asks for it: APC only. */
  readonly lowestUnmatedDb: number | null;
  readonly basis: Basis;
}

const fromMemory: Basis = { rests: 'from memory', source: 'IEC 61753-1 and 61755-1', confirmed: null };
const single = (grade: string, highestMeanDb: number, highest97PercentDb: number): LossGrade => ({
  grade,
  fibre: 'single-mode',
  highestMeanDb,
  highest97PercentDb,
  basis: fromMemory,
});
const multi = (grade: string): LossGrade => ({
  grade,
  fibre: 'multimode',
  highestMeanDb: null,
  highest97PercentDb: null,
  basis: fromMemory,
});

export const lossGrades: readonly LossGrade[] = [
  single('A', 0.07, 0.15),
  single('B', 0.12, 0.25),
  single('C', 0.25, 0.5),
  single('D', 0.5, 1),
  multi('Am'),
  multi('Bm'),
  multi('Cm'),
  multi('Dm'),
];

const reflected = (grade: string, lowestMatedDb: number, lowestUnmatedDb: number | null): ReturnLossGrade => ({
  grade,
  lowestMatedDb,
  lowestUnmatedDb,
  basis: fromMemory,
});

export const returnLossGrades: readonly ReturnLossGrade[] = [
  reflected('1', 60, 55),
  reflected('2', 45, null),
  reflected('3', 35, null),
  reflected('4', 26, null),
];

export type GradeTelling = { readonly grade: string; readonly unconfirmed: boolean } & (
  | { readonly tells: 'within the 97 % limit of the grade'; readonly limitDb: number }
  | { readonly tells: 'above the 97 % limit of the grade'; readonly limitDb: number }
  | { readonly tells: 'limit not known' }
);

/** On which side of each grade's 97 % limit one loss lies. */
export function tellLossGrades(
  lossDb: number,
  fibre: LossGrade['fibre'],
  grades: readonly LossGrade[] = lossGrades,
): Result<readonly GradeTelling[], NumberRefusal<'lossDb'>> {
  const refusal = checkNumber('lossDb', lossDb, lossTyping.possible);
  if (refusal) return failed(refusal);
  return ok(
    grades
      .filter((grade) => grade.fibre === fibre)
      .map(({ grade, highest97PercentDb: limitDb, basis }): GradeTelling => {
        const unconfirmed = isUnconfirmed(basis);
        if (limitDb === null) return { grade, unconfirmed, tells: 'limit not known' };
        const tells = isAtMost(lossDb, limitDb)
          ? 'within the 97 % limit of the grade'
          : 'above the 97 % limit of the grade';
        return { grade, unconfirmed, tells, limitDb };
      }),
  );
}

export interface ReturnLossTelling {
  readonly grade: string;
  readonly unconfirmed: boolean;
  readonly tells: 'at least the limit of the grade' | 'below the limit of the grade';
  readonly limitDb: number;
}

/** On which side of each grade's limit one mated return loss (positive dB) lies. */
export function tellReturnLossGrades(
  returnLossDb: number,
  grades: readonly ReturnLossGrade[] = returnLossGrades,
): Result<readonly ReturnLossTelling[], NumberRefusal<'returnLossDb'>> {
  const refusal = checkNumber('returnLossDb', returnLossDb, returnLossTyping.possible);
  if (refusal) return failed(refusal);
  return ok(
    grades.map(({ grade, lowestMatedDb: limitDb, basis }) => ({
      grade,
      unconfirmed: isUnconfirmed(basis),
      tells: isAtLeast(returnLossDb, limitDb) ? 'at least the limit of the grade' : 'below the limit of the grade',
      limitDb,
    })),
  );
}
