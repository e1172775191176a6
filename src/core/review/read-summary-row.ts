import { failed, ok, type Result } from '../unit/result.ts';
import type { FinishedConnector } from './batch-account.ts';
import {
  all,
  fields,
  isObject,
  listOf,
  mismatch,
  number,
  oneOf,
  orNull,
  text,
  whole,
  wholeFrom,
  yesOrNo,
} from './json-check.ts';
import type { Check, Mismatch } from './json-check.ts';
import { summaryVersion, type SummaryRow } from './summary-row.ts';

/** Why a stored text is not a row that counts. Of another version or damaged: it is made anew from the log. */
export type SummaryRowProblem =
  | { readonly kind: 'not JSON' }
  | { readonly kind: 'other version'; readonly found: number; readonly expected: number }
  | ({ readonly kind: 'not a summary row' } & Mismatch);

/** Reads a stored row; it never throws. */
export function readSummaryRow(stored: string): Result<SummaryRow, SummaryRowProblem> {
  let value: unknown;
  try {
    value = JSON.parse(stored);
  } catch {
    return failed({ kind: 'not JSON' });
  }
  const version = isObject(value) ? value['version'] : undefined;
  if (typeof version === 'number' && version !== summaryVersion) {
    return failed({ kind: 'other version', found: version, expected: summaryVersion });
  }
  const found = row(value);
  return found ? failed({ kind: 'not a summary row', ...found }) : ok(value as SummaryRow);
}

const wallMs = whole;
const spanMs = wholeFrom(0);
const tag = wholeFrom(1, 12);
const count = wholeFrom(1, 1000);

/** What must hold between the fields of a connector; run after their own checks. */
const consistent: Check = (value) => {
  const { outcome, defect, firstPass, attempt, reworks, totalMs, ...parts } = value as FinishedConnector;
  if ((outcome === 'passed') !== (defect === null)) {
    return mismatch(
      '/defect',
      outcome === 'passed' ? 'null, since it passed' : 'a defect, since it was scrapped',
      defect,
    );
  }
  if (firstPass && (outcome !== 'passed' || attempt !== 1 || reworks !== 0)) {
    return mismatch('/firstPass', 'false, since it did not pass at once', firstPass);
  }
  const sumMs = parts.handsOnMs + parts.cureMs + parts.waitingMs;
  return sumMs === totalMs ? null : mismatch('/totalMs', `${sumMs}, the sum of its parts`, totalMs);
};

const connector = all(
  fields({
    number: count,
    outcome: oneOf('passed', 'scrapped'),
    attempt: wholeFrom(1),
    firstPass: yesOrNo,
    reworks: wholeFrom(0),
    finishedWallMs: wallMs,
    defect: orNull(text),
    totalMs: spanMs,
    handsOnMs: spanMs,
    cureMs: spanMs,
    waitingMs: spanMs,
    acrossClocks: yesOrNo,
  }),
  consistent,
);

const defectCount = fields({
  kind: oneOf('sent back', 'scrapped'),
  defect: text,
  step: text,
  wallMs,
  connectors: count,
});

const loadClock = fields({ kind: oneOf('cure', 'wait', 'polish'), load: text, station: text });
const workingLife = fields({ kind: oneOf('working life'), mix: orNull(text) });
const clock: Check = (value) =>
  isObject(value) && value['kind'] === 'working life' ? workingLife(value) : loadClock(value);

const lateness = fields({
  clock,
  batch: text,
  tag,
  step: text,
  connectors: count,
  lateS: number,
  verdict: oneOf('in time', 'early', 'over'),
  reason: orNull(text),
  seenLateS: orNull(number),
  wallMs,
});

const row = fields({
  version: wholeFrom(summaryVersion, summaryVersion),
  batch: text,
  tag,
  workOrder: text,
  recipe: fields({ id: text, revision: text, hash: text }),
  openedWallMs: wallMs,
  closedWallMs: wallMs,
  connectors: listOf(connector),
  defects: listOf(defectCount),
  lateness: listOf(lateness),
});
