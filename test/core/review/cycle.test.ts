import { describe, expect, test } from 'vitest';
import { cycleOf } from '../../../src/core/review/cycle.ts';
import { latenessOf } from '../../../src/core/review/lateness.ts';
import { summaryRow } from '../../../src/core/review/summary-row.ts';
import { DayBook } from './day-book.ts';
import { hashOf, takenRecipes } from './tiny-recipe.ts';

const minuteMs = 60_000;
const v = 1 as const;

/** Opened at 0, mixed at 1 and filled at 2 minutes, in the oven from 3 minutes on; nothing of it hands-on. */
function inTheOven(connectors: readonly number[]): DayBook {
  const book = new DayBook('batch-1', takenRecipes(['tiny']));
  const at = (minute: number) => ({ benchMs: minute * minuteMs, wallMs: minute * minuteMs });
  const all = [...connectors];
  book.write(at(0), {
    type: 'batchOpened',
    v,
    data: { tag: 1, workOrder: 'WO 1', recipe: hashOf('tiny'), connectors: all.map(() => ({})) },
  });
  book.write(at(1), { type: 'stepFinished', v, data: { step: 'mix', connectors: all, mix: 'mix-1' } });
  book.write(at(2), { type: 'stepFinished', v, data: { step: 'fill', connectors: all } });
  book.write(at(3), { type: 'loadStarted', v, data: { load: 'load-1', step: 'cure', connectors: all, station: 'o' } });
  return book;
}

function cycleOfFirst(book: DayBook) {
  const batch = book.batch();
  const [connector] = batch.connectors;
  if (!connector) throw new Error('no connector');
  return cycleOf(batch, connector);
}

describe('cycle time', () => {
  test('scrapped out of the oven: the time in it was cure', () => {
    const book = inTheOven([1]);
    const at = 23 * minuteMs;
    book.write({ benchMs: at, wallMs: at }, { type: 'scrapped', v, data: { connectors: [1], defect: 'crack' } });
    expect(cycleOfFirst(book)).toMatchObject({ totalMs: 23 * minuteMs, cureMs: 20 * minuteMs, handsOnMs: 0 });
  });

  test('hands-on gives way to cure where together they exceed the total', () => {
    const book = inTheOven([1]);
    const out = 33 * minuteMs;
    const ended = { load: 'load-1', verdict: 'in time', lateS: 0 } as const;
    book.write({ benchMs: out, wallMs: out }, { type: 'loadEnded', v, data: ended });
    const started = { load: 'load-2', step: 'cool', connectors: [1], station: 'tray', gap: 25 * 60 };
    book.write({ benchMs: out, wallMs: out, by: 'JT' }, { type: 'loadStarted', v, data: started });
    // total 33, cure 30, and JT's entry reaches back 25 minutes over the cure: 3 are left for hands-on
    expect(cycleOfFirst(book)).toMatchObject({ handsOnMs: 3 * minuteMs, cureMs: 30 * minuteMs, waitingMs: 0 });
  });

  test('across two tablets the wall clocks count, clamped at 0, and it says so', () => {
    const book = inTheOven([1]);
    const other = { log: 'log-b', benchMs: 7, by: 'JT' };
    book.write(
      { ...other, wallMs: 13 * minuteMs },
      { type: 'scrapped', v, data: { connectors: [1], defect: 'crack' } },
    );
    expect(cycleOfFirst(book)).toMatchObject({ totalMs: 13 * minuteMs, cureMs: 10 * minuteMs, acrossClocks: true });
  });

  test('never negative, where a late entry and a clock set forward reach back before the opening', () => {
    const book = inTheOven([1]);
    const other = { log: 'log-b', benchMs: 7, wallMs: 4 * minuteMs };
    book.write(other, { type: 'sentBack', v, data: { connectors: [1], to: 'fill', defect: 'void', attempt: 'same' } });
    const setForward = { benchMs: 5 * minuteMs, wallMs: 60 * minuteMs };
    book.write(setForward, { type: 'scrapped', v, data: { connectors: [1], defect: 'crack', ago: 10 * 60 } });
    expect(cycleOfFirst(book)).toMatchObject({ totalMs: 0, handsOnMs: 0, cureMs: 0, waitingMs: 0 });
  });

  test('a re-terminated connector is the same connector: its times run on, and it is not right first time', () => {
    const book = inTheOven([1]);
    const at = (minute: number) => ({ benchMs: minute * minuteMs, wallMs: minute * minuteMs });
    book.write(at(8), { type: 'sentBack', v, data: { connectors: [1], to: 'mix', defect: 'void', attempt: 'new' } });
    book.write(at(9), { type: 'stepFinished', v, data: { step: 'mix', connectors: [1], mix: 'mix-2' } });
    book.write(at(10), { type: 'stepFinished', v, data: { step: 'fill', connectors: [1] } });
    const loads = [
      { load: 'load-2', step: 'cure', from: 11, to: 41 },
      { load: 'load-3', step: 'cool', from: 41, to: 46 },
      { load: 'load-4', step: 'polish', from: 47, to: 51 },
    ];
    for (const { load, step, from, to } of loads) {
      book.write(at(from), { type: 'loadStarted', v, data: { load, step, connectors: [1], station: 'o' } });
      book.write(at(to), { type: 'loadEnded', v, data: { load, verdict: 'in time', lateS: 0 } });
    }
    book.write(at(52), { type: 'judged', v, data: { step: 'inspect', connectors: [1], verdict: 'pass' } });
    // cure: 5 in the first attempt (3 to 8), then 30 and 5
    expect(cycleOfFirst(book)).toMatchObject({
      totalMs: 52 * minuteMs,
      cureMs: 40 * minuteMs,
      attempt: 2,
      firstPass: false,
    });
    book.write(at(53), { type: 'batchClosed', v, data: { how: 'complete' } });
    const row = summaryRow(book.batch());
    expect(row?.connectors).toMatchObject([{ outcome: 'passed', attempt: 2, reworks: 0, firstPass: false }]);
    expect(row?.defects).toEqual([
      { kind: 'sent back', defect: 'void', step: 'cure', wallMs: 8 * minuteMs, connectors: 1 },
    ]);
  });
});

describe('lateness', () => {
  test('a load left one by one has no end of its own that a person answered', () => {
    const book = inTheOven([1]);
    book.write({ benchMs: 5e5, wallMs: 5e5 }, { type: 'scrapped', v, data: { connectors: [1], defect: 'crack' } });
    expect(latenessOf(book.batch())).toEqual([]);
  });

  test('an overrun of several connectors in one entry is one clock', () => {
    const book = new DayBook('batch-1', takenRecipes(['tiny']));
    const at = (minute: number) => ({ benchMs: minute * minuteMs, wallMs: minute * minuteMs });
    const connectors = [1, 2, 3];
    const opening = { tag: 1, workOrder: 'WO 1', recipe: hashOf('tiny'), connectors: connectors.map(() => ({})) };
    book.write(at(0), { type: 'batchOpened', v, data: opening });
    book.write(at(1), { type: 'stepFinished', v, data: { step: 'mix', connectors, mix: 'mix-1' } });
    const overrun = (lateS: number) => ({ overrun: { lateS, reason: 'thin' } });
    book.write(at(70), { type: 'stepFinished', v, data: { step: 'fill', connectors: [1, 2], ...overrun(600) } });
    book.write(at(71), { type: 'stepFinished', v, data: { step: 'fill', connectors: [3], ...overrun(660) } });
    expect(latenessOf(book.batch())).toMatchObject([
      { clock: { kind: 'working life' }, connectors: 2, lateS: 600, verdict: 'over', reason: 'thin' },
      { clock: { kind: 'working life' }, connectors: 1, lateS: 660, verdict: 'over', reason: 'thin' },
    ]);
    expect(latenessOf(book.batch()).map(({ clock }) => clock)).toEqual([
      { kind: 'working life', mix: 'mix-1' },
      { kind: 'working life', mix: 'mix-1' },
    ]);
    book.write(at(72), { type: 'sentBack', v, data: { connectors, to: 'mix', defect: 'void', attempt: 'new' } });
    book.write(at(73), { type: 'stepFinished', v, data: { step: 'mix', connectors, mix: 'mix-2' } });
    expect(latenessOf(book.batch()).map(({ clock }) => clock)).toEqual([
      { kind: 'working life', mix: null },
      { kind: 'working life', mix: null },
    ]);
  });
});
