import { describe, expect, test } from 'vitest';
import type { Batch } from '../../../src/core/batch/types.ts';
import { cycleOf } from '../../../src/core/review/cycle.ts';
import { shiftOf } from '../../../src/core/review/shift.ts';
import { summaryRow, type SummaryRow } from '../../../src/core/review/summary-row.ts';
import { batchOfFour, clockMs } from './hand-reckoned.ts';

const minuteMs = 60_000;
const minutes = (count: number) => count * minuteMs;

function closedRow(): SummaryRow {
  const row = summaryRow(batchOfFour().batch());
  if (!row) throw new Error('the batch is closed');
  return row;
}

function cycleInMinutes(batch: Batch, number: number) {
  const connector = batch.connectors[number - 1];
  if (!connector) throw new Error(`no connector ${number}`);
  const { totalMs, handsOnMs, cureMs, waitingMs, finishedAt, ...rest } = cycleOf(batch, connector);
  const parts = [totalMs, handsOnMs, cureMs, waitingMs].map((ms) => ms / minuteMs);
  return { parts, finishedMs: finishedAt?.wall ?? null, ...rest };
}

describe('cycle times reckoned by hand', () => {
  const batch = batchOfFour().batch();

  test('numbers 1 and 2, right first time', () => {
    // total 08:00 to 09:02 = 62
    // hands-on: mix 4/4 + fill 8/4 + into the oven 2/4 + onto the disc 2/4 + polish 4/4 + inspect 2/2 = 6
    // cure: oven 08:14 to 08:44 = 30, cooling 08:44 to 08:54 = 10, together 40
    // waiting: 62 - 6 - 40 = 16
    const expected = { parts: [62, 6, 40, 16], attempt: 1, firstPass: true, acrossClocks: false };
    for (const number of [1, 2]) {
      expect(cycleInMinutes(batch, number)).toEqual({ ...expected, finishedMs: clockMs('09:02') });
    }
  });

  test('number 3, sent back once', () => {
    // total 08:00 to 09:12 = 72
    // hands-on: 6 as above + onto the disc 4/1 + polish 2/1 + inspect 2/1 = 14; cure 40; waiting 72 - 14 - 40 = 18
    const expected = { parts: [72, 14, 40, 18], attempt: 1, firstPass: false, acrossClocks: false };
    expect(cycleInMinutes(batch, 3)).toEqual({ ...expected, finishedMs: clockMs('09:12') });
  });

  test('number 4, scrapped', () => {
    // total 08:00 to 09:04 = 64; hands-on 6; cure 40; waiting 64 - 6 - 40 = 18
    const expected = { parts: [64, 6, 40, 18], attempt: 1, firstPass: false, acrossClocks: false };
    expect(cycleInMinutes(batch, 4)).toEqual({ ...expected, finishedMs: clockMs('09:04') });
  });

  test('in work at 09:09: no end yet, and times up to the last entry', () => {
    // last entry 09:08 = 68; hands-on 6 + onto the disc 4 = 10; cure 40; waiting 18
    const expected = { parts: [68, 10, 40, 18], attempt: 1, firstPass: false, acrossClocks: false };
    expect(cycleInMinutes(batchOfFour('09:09').batch(), 3)).toEqual({ ...expected, finishedMs: null });
  });
});

describe('the shift reckoned by hand', () => {
  const shift = shiftOf([closedRow()], [], clockMs('06:00'), clockMs('14:00'));

  test('connectors', () => {
    expect(shift).toMatchObject({ carriedIn: 0, started: 4, passed: 3, scrapped: 1, finished: 4, inWork: 0 });
  });

  test('first-pass yield', () => {
    // numbers 1 and 2 of 4: 2/4 = 0.5
    // Wilson at z = 1.959964, z^2 = 3.841459: (2 + 1.920729 +- 1.959964 * sqrt(1 + 0.960365)) / 7.841459
    //   = (3.920729 +- 2.744205) / 7.841459 = 0.150039 and 0.849961
    expect(shift.firstPass).toMatchObject({ count: 2, of: 4, share: 0.5 });
    expect(shift.firstPass?.low).toBeCloseTo(0.150039, 5);
    expect(shift.firstPass?.high).toBeCloseTo(0.849961, 5);
  });

  test('cycle times of those that passed', () => {
    // totals 62 62 72: median 62; 90th percentile, type 7: position 2 * 0.9 = 1.8, 62 + 0.8 * 10 = 70; sum 196
    // hands-on 6 6 14: median 6; 6 + 0.8 * 8 = 12.4; sum 26
    // cure 40 40 40: sum 120
    // waiting 16 16 18: median 16; 16 + 0.8 * 2 = 17.6; sum 50; and 26 + 120 + 50 = 196
    const spread = (median: number, ninetieth: number, sum: number) => ({
      medianMs: minutes(median),
      ninetiethPercentileMs: minutes(ninetieth),
      sumMs: minutes(sum),
    });
    expect(shift.cycle.passed).toEqual({
      connectors: 3,
      total: spread(62, 70, 196),
      handsOn: spread(6, 12.4, 26),
      cure: spread(40, 40, 120),
      waiting: spread(16, 17.6, 50),
      acrossClocks: 0,
    });
  });

  test('cycle time of the one scrapped', () => {
    expect(shift.cycle.scrapped).toMatchObject({ connectors: 1, total: { medianMs: minutes(64), sumMs: minutes(64) } });
  });

  test('causes', () => {
    expect(shift.sendBacks).toEqual([{ defect: 'scratch', connectors: 1 }]);
    expect(shift.scraps).toEqual([{ defect: 'crack', connectors: 1 }]);
  });

  test('clocks', () => {
    const common = { batch: 'batch-1', tag: 2, reason: null, seenLateS: null, connectors: 4, verdict: 'in time' };
    const load = (kind: string, id: string, station: string) => ({ kind, load: id, station });
    expect(shift.lateness).toEqual([
      {
        ...common,
        clock: { kind: 'working life', mix: 'mix-1' },
        step: 'fill',
        lateS: 90,
        seenLateS: 30,
        verdict: 'over',
        reason: 'phone',
        wallMs: clockMs('08:12'),
      },
      {
        ...common,
        clock: load('cure', 'load-1', 'oven-1'),
        step: 'cure',
        lateS: 0,
        wallMs: clockMs('08:44'),
      },
      {
        ...common,
        clock: load('wait', 'load-2', 'tray'),
        step: 'cool',
        lateS: 300,
        seenLateS: 180,
        wallMs: clockMs('08:54'),
      },
      { ...common, clock: load('polish', 'load-3', 'disc'), step: 'polish', lateS: 0, wallMs: clockMs('09:00') },
      {
        ...common,
        clock: load('polish', 'load-4', 'disc'),
        step: 'polish',
        lateS: -120,
        verdict: 'early',
        reason: 'light scratch',
        connectors: 1,
        wallMs: clockMs('09:10'),
      },
    ]);
  });

  test('by recipe', () => {
    const [only, ...others] = shift.byRecipe;
    expect(others).toEqual([]);
    expect(only).toMatchObject({ recipe: { id: 'tiny', revision: 'A' }, passed: 3, scrapped: 1, inWork: 0 });
  });
});

describe('a shift that ends at 09:05, with number 3 still in work', () => {
  const early = { carriedIn: 0, started: 4, passed: 2, scrapped: 1, inWork: 1 };
  const late = { carriedIn: 1, started: 0, passed: 1, scrapped: 0, inWork: 0 };

  test('from the row of the closed batch', () => {
    const rows = [closedRow()];
    expect(shiftOf(rows, [], clockMs('06:00'), clockMs('09:05'))).toMatchObject(early);
    expect(shiftOf(rows, [], clockMs('09:05'), clockMs('14:00'))).toMatchObject(late);
  });

  test('from the batch while it is open', () => {
    const batch = batchOfFour('09:05').batch();
    expect(shiftOf([], [batch], clockMs('06:00'), clockMs('14:00'))).toMatchObject(early);
  });

  test('a connector finished on the border belongs to the later shift', () => {
    const shift = shiftOf([closedRow()], [], clockMs('06:00'), clockMs('09:12'));
    expect(shift).toMatchObject({ passed: 2, inWork: 1 });
  });
});

test('a reopened batch counts once, from its state and not from the row of its first closing', () => {
  const shift = shiftOf([closedRow()], [batchOfFour('09:13').batch()], clockMs('06:00'), clockMs('14:00'));
  expect(shift).toMatchObject({ passed: 3, scrapped: 1, inWork: 0 });
});

test('a ratio of nothing is null, and so are times of nothing', () => {
  const shift = shiftOf([], [batchOfFour('08:30').batch()], clockMs('06:00'), clockMs('14:00'));
  expect(shift).toMatchObject({ inWork: 4, finished: 0, firstPass: null, cycle: { passed: null, scrapped: null } });
});
