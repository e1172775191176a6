import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readSummaryRow } from '../../../src/core/review/read-summary-row.ts';
import {
  summaryKey,
  summaryKeysFrom,
  summaryRow,
  summaryVersion,
  type SummaryRow,
} from '../../../src/core/review/summary-row.ts';
import { batchOfFour, clockMs } from './hand-reckoned.ts';
import { randomBatches } from './random-batches.ts';
import { hashOf } from './tiny-recipe.ts';

function closedRow(): SummaryRow {
  const row = summaryRow(batchOfFour().batch());
  if (!row) throw new Error('the batch is closed');
  return row;
}

describe('the row of a closed batch', () => {
  const row = closedRow();

  test('says what it is of', () => {
    expect(row).toMatchObject({
      version: summaryVersion,
      batch: 'batch-1',
      tag: 2,
      workOrder: 'WO 17',
      recipe: { id: 'tiny', revision: 'A', hash: hashOf('tiny') },
      openedWallMs: clockMs('08:00'),
      closedWallMs: clockMs('09:15'),
    });
  });

  test('has every connector', () => {
    expect(row.connectors).toMatchObject([
      { number: 1, outcome: 'passed', defect: null, attempt: 1, firstPass: true, reworks: 0 },
      { number: 2, outcome: 'passed', defect: null, attempt: 1, firstPass: true, reworks: 0 },
      { number: 3, outcome: 'passed', defect: null, attempt: 1, firstPass: false, reworks: 1 },
      { number: 4, outcome: 'scrapped', defect: 'crack', attempt: 1, firstPass: false, reworks: 0 },
    ]);
  });

  test('has the causes with their step and time', () => {
    const common = { step: 'inspect', wallMs: clockMs('09:04'), connectors: 1 };
    expect(row.defects).toEqual([
      { ...common, kind: 'sent back', defect: 'scratch' },
      { ...common, kind: 'scrapped', defect: 'crack' },
    ]);
  });

  test('is not there while the batch is open', () => {
    expect(summaryRow(batchOfFour('09:13').batch())).toBeNull();
  });
});

describe('keys of rows', () => {
  const row = closedRow();

  test('13 digits of the closing time, then the batch', () => {
    expect(summaryKey(row)).toBe(`summary:${clockMs('09:15')}:batch-1`);
    expect(summaryKey({ ...row, closedWallMs: 12, connectors: [], defects: [], lateness: [] })).toBe(
      'summary:0000000000012:batch-1',
    );
  });

  test('a wall clock set back before closing does not hide what came before', () => {
    expect(summaryKey({ ...row, closedWallMs: clockMs('07:00') })).toBe(`summary:${clockMs('09:12')}:batch-1`);
  });

  test('the range from an instant holds every row that tells of something at it or later', () => {
    fc.assert(
      fc.property(randomBatches, (batches) => {
        for (const one of batches.flatMap((batch) => summaryRow(batch) ?? [])) {
          const walls = [
            one.closedWallMs,
            ...one.connectors.map(({ finishedWallMs }) => finishedWallMs),
            ...[...one.defects, ...one.lateness].map(({ wallMs }) => wallMs),
          ];
          for (const wallMs of walls) {
            const { lower, upper } = summaryKeysFrom(wallMs);
            expect(lower <= summaryKey(one) && summaryKey(one) < upper).toBe(true);
          }
          const after = Math.max(...walls) + 1;
          expect(summaryKey(one) < summaryKeysFrom(after).lower).toBe(true);
        }
      }),
      { numRuns: 60 },
    );
  });

  test('all rows lie in the range from the beginning of time', () => {
    const { lower, upper } = summaryKeysFrom(-Infinity);
    expect(lower <= summaryKey(row) && summaryKey(row) < upper).toBe(true);
    expect('summary:0000000000000' < lower && upper > 'summary:9999999999999:zzz').toBe(true);
  });
});

describe('reading a stored row', () => {
  test('what was written is read', () => {
    fc.assert(
      fc.property(randomBatches, (batches) => {
        for (const row of batches.flatMap((batch) => summaryRow(batch) ?? [])) {
          expect(readSummaryRow(JSON.stringify(row))).toEqual({ ok: true, value: row });
        }
      }),
      { numRuns: 60 },
    );
  });

  test('a text that is no JSON', () => {
    expect(readSummaryRow('{"version":1,')).toEqual({ ok: false, error: { kind: 'not JSON' } });
  });

  test('a row of another version is told apart from a damaged one', () => {
    const text = JSON.stringify({ ...closedRow(), version: summaryVersion + 1 });
    const error = { kind: 'other version', found: summaryVersion + 1, expected: summaryVersion };
    expect(readSummaryRow(text)).toEqual({ ok: false, error });
  });

  const [first] = closedRow().connectors;
  const withConnector = (change: object) => ({ ...closedRow(), connectors: [{ ...first, ...change }] });
  test.each([
    [null, '', 'an object', 'null'],
    [[], '', 'an object', '[]'],
    [{}, '/version', 'a whole number from 1 to 1', 'nothing'],
    [{ ...closedRow(), tag: 13 }, '/tag', 'a whole number from 1 to 12', '13'],
    [{ ...closedRow(), recipe: 'tiny' }, '/recipe', 'an object', '"tiny"'],
    [{ ...closedRow(), closedWallMs: '2026' }, '/closedWallMs', 'a whole number', '"2026"'],
    [{ ...closedRow(), connectors: {} }, '/connectors', 'a list', '{}'],
    [withConnector({ number: 0 }), '/connectors/0/number', 'a whole number from 1 to 1000', '0'],
    [withConnector({ outcome: 'lost' }), '/connectors/0/outcome', '"passed" or "scrapped"', '"lost"'],
    [withConnector({ cureMs: -1 }), '/connectors/0/cureMs', 'a whole number from 0', '-1'],
    [withConnector({ outcome: 'scrapped' }), '/connectors/0/defect', 'a defect, since it was scrapped', 'null'],
    [withConnector({ defect: 'crack' }), '/connectors/0/defect', 'null, since it passed', '"crack"'],
    [withConnector({ attempt: 2 }), '/connectors/0/firstPass', 'false, since it did not pass at once', 'true'],
    [withConnector({ totalMs: 1 }), '/connectors/0/totalMs', '3720000, the sum of its parts', '1'],
    [
      { ...closedRow(), lateness: [{ clock: { kind: 'sun' } }] },
      '/lateness/0/clock/kind',
      '"cure" or "wait" or "polish"',
      '"sun"',
    ],
  ])('%# a damaged one is refused with the place, what was expected and what stood there', (value, ...rest) => {
    const [path, expected, found] = rest;
    const error = { kind: 'not a summary row', path, expected, found };
    expect(readSummaryRow(JSON.stringify(value))).toEqual({ ok: false, error });
  });

  test('any JSON and any text is answered, never thrown', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.json()), (stored) => {
        expect(readSummaryRow(stored).ok).toBe(false);
      }),
      { numRuns: 300 },
    );
  });

  test('any one field taken away or changed in kind is noticed', () => {
    const paths = fc.constantFrom(
      ...(['batch', 'tag', 'workOrder', 'recipe', 'openedWallMs', 'closedWallMs', 'connectors', 'defects'] as const),
    );
    fc.assert(
      fc.property(paths, fc.constantFrom(undefined, null, true, Number.NaN), (name, wrong) => {
        expect(readSummaryRow(JSON.stringify({ ...closedRow(), [name]: wrong })).ok).toBe(false);
      }),
      { numRuns: 64 },
    );
  });
});
