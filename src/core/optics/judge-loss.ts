import { decimal, isAtLeast, isAtMost } from '../unit/decimal.ts';
import { checkNumber, type NumberRefusal } from '../unit/number-check.ts';
import { failed, ok, type Result } from '../unit/result.ts';
import { maximumAcceptableLossDb, type BudgetRefusal, type Parts } from './budget.ts';
import type { Light } from './component-losses.ts';
import { lossTyping, takeLoss, type LossRefusal } from './readings.ts';

/** Multimode is measured in both directions, and the higher loss decides. */
export type MeasuredLoss =
  | { readonly light: Extract<Light, { fibre: 'single-mode' }>; readonly lossDb: number }
  | {
      readonly light: Extract<Light, { fibre: 'multimode' }>;
      readonly lossAToBDb: number;
      readonly lossBToADb: number;
    };

/** Readings before and after every connection was taken apart and cleaned. */
export type Look = 'first' | 'after cleaning';

export type LossRule =
  | 'at most the loss that the supplier states'
  | 'at most the maximum acceptable loss'
  | 'above the maximum by less than the margin'
  | 'still above the maximum after cleaning'
  | 'above the maximum by the margin or more';

export interface LossVerdict {
  readonly verdict: 'accept' | 'clean and retest' | 'reterminate or replace' | 'reject';
  readonly rule: LossRule;
  /** The loss that decided: of both directions the higher. */
  readonly lossDb: number;
  readonly direction: 'only' | 'A to B' | 'B to A';
  /** What it was compared with. */
  readonly limitDb: number;
  /** Above the maximum by this much it is rejected. */
  readonly marginDb: number;
  readonly source: string;
}

export type JudgeRefusal = LossRefusal | BudgetRefusal | NumberRefusal<'supplierLossDb' | 'specifiedLossDb'>;

/** Worse is higher. */
export const lossSeverity: Readonly<Record<LossVerdict['verdict'], number>> = {
  accept: 0,
  'clean and retest': 1,
  'reterminate or replace': 2,
  reject: 3,
};

export interface AssemblyTest {
  readonly measured: MeasuredLoss;
  readonly parts: Parts;
  /** Only at acceptance the supplier's own stated loss comes first; null where none was stated. */
  readonly occasion:
    { readonly kind: 'acceptance'; readonly supplierLossDb: number | null } | { readonly kind: 'installation' };
  readonly look: Look;
}

export interface LinkTest {
  readonly measured: MeasuredLoss;
  /** An unknown length is taken as zero. */
  readonly limit:
    | { readonly kind: 'specified'; readonly specifiedLossDb: number }
    | {
        readonly kind: 'computed';
        readonly parts: Omit<Parts, 'lengthM'> & { readonly lengthM: number | 'unknown' };
      };
  readonly look: Look;
}

const assemblyMarginDb = 0.5;
const linkMarginDb = 1;
const assemblySource = 'MIL-STD-2042-6B, method 6C1, 3.3.2';
/** The end of step 2 was not seen: a link under the margin is taken to be cleaned and tested again as an assembly is. */
const linkSource = 'MIL-STD-2042-6B, method 6E1, 3.3.2';

type Deciding = Pick<LossVerdict, 'lossDb' | 'direction'>;

function deciding(measured: MeasuredLoss): Result<Deciding, LossRefusal> {
  if ('lossDb' in measured) {
    const only = takeLoss(measured.lossDb);
    return only.ok ? ok({ lossDb: only.value.lossDb, direction: 'only' }) : only;
  }
  const there = takeLoss(measured.lossAToBDb);
  if (!there.ok) return there;
  const back = takeLoss(measured.lossBToADb);
  if (!back.ok) return back;
  const isBack = back.value.lossDb > there.value.lossDb;
  return ok({ lossDb: (isBack ? back : there).value.lossDb, direction: isBack ? 'B to A' : 'A to B' });
}

function compare(
  { lossDb, direction }: Deciding,
  look: Look,
  limits: Pick<LossVerdict, 'limitDb' | 'marginDb' | 'source'>,
): LossVerdict {
  const common = { lossDb, direction, ...limits };
  if (isAtMost(lossDb, limits.limitDb)) {
    return { verdict: 'accept', rule: 'at most the maximum acceptable loss', ...common };
  }
  if (isAtLeast(lossDb, limits.limitDb + limits.marginDb)) {
    return { verdict: 'reject', rule: 'above the maximum by the margin or more', ...common };
  }
  return look === 'first'
    ? { verdict: 'clean and retest', rule: 'above the maximum by less than the margin', ...common }
    : { verdict: 'reterminate or replace', rule: 'still above the maximum after cleaning', ...common };
}

/** A cable assembly by MIL-STD-2042-6B, method 6C1. */
export function judgeAssembly(test: AssemblyTest): Result<LossVerdict, JudgeRefusal> {
  const decided = deciding(test.measured);
  if (!decided.ok) return decided;
  const maximum = maximumAcceptableLossDb(test.measured.light, test.parts);
  if (!maximum.ok) return maximum;
  const limits = { limitDb: maximum.value, marginDb: assemblyMarginDb, source: assemblySource };
  const supplierLossDb = test.occasion.kind === 'acceptance' ? test.occasion.supplierLossDb : null;
  if (supplierLossDb !== null) {
    const refusal = checkNumber('supplierLossDb', supplierLossDb, lossTyping.possible);
    if (refusal) return failed(refusal);
    if (isAtMost(decided.value.lossDb, supplierLossDb)) {
      const rule = 'at most the loss that the supplier states';
      return ok({ verdict: 'accept', rule, ...decided.value, ...limits, limitDb: decimal(supplierLossDb) });
    }
  }
  return ok(compare(decided.value, test.look, limits));
}

/** A link by MIL-STD-2042-6B, method 6E1: against the specified loss, else against the budget. */
export function judgeLink(test: LinkTest): Result<LossVerdict, JudgeRefusal> {
  const decided = deciding(test.measured);
  if (!decided.ok) return decided;
  const limit = linkLimitDb(test);
  if (!limit.ok) return limit;
  return ok(compare(decided.value, test.look, { limitDb: limit.value, marginDb: linkMarginDb, source: linkSource }));
}

function linkLimitDb({ limit, measured }: LinkTest): Result<number, JudgeRefusal> {
  if (limit.kind === 'specified') {
    const refusal = checkNumber('specifiedLossDb', limit.specifiedLossDb, lossTyping.possible);
    return refusal ? failed(refusal) : ok(decimal(limit.specifiedLossDb));
  }
  const { lengthM } = limit.parts;
  return maximumAcceptableLossDb(measured.light, { ...limit.parts, lengthM: lengthM === 'unknown' ? 0 : lengthM });
}
