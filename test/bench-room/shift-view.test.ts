import { describe, expect, test } from 'vitest';
import { latenessViews } from '../../src/bench/shift-lateness.ts';
import {
  causes,
  cycleView,
  recipeRows,
  shiftFigures,
  shiftSentence,
  windowHours,
  windowName,
} from '../../src/bench/shift-view.ts';
import { shiftChoices } from '../../src/bench/shift-windows.ts';
import { shiftOf } from '../../src/core/review/shift.ts';
import { summaryRow } from '../../src/core/review/summary-row.ts';
import { en } from '../../src/words/en.ts';
import { from, Script } from '../fake/script.ts';
import { cooled } from './small-batches.ts';
import { zone } from '../core/review/zones.ts';

const utc = () => 0;

/** Four connectors: 1 and 2 pass at once, 3 passes after one rework, 4 is scrapped; and two more still at strip. */
function shift() {
  const script = cooled(new Script(), 'b1', 4);
  const film = (load: string, connectors: number[]) =>
    script
      .do({ type: 'start load', batch: 'b1', step: 'film-1', load, station: '', connectors })
      .wait(60)
      .do({ type: 'end load', batch: 'b1', load, nextLoad: 'none' });
  film('f1', from(1, 4));
  script
    .do({ type: 'pass', batch: 'b1', step: 'inspect', connectors: [1, 2] })
    .do({ type: 'send back', batch: 'b1', connectors: [3], to: 'film-1', defect: 'scratch' })
    .do({ type: 'scrap', batch: 'b1', connectors: [4], defect: 'crack' });
  film('f2', [3])
    .do({ type: 'pass', batch: 'b1', step: 'inspect', connectors: [3] })
    .do({ type: 'pass', batch: 'b1', step: 'measure', connectors: [1, 2, 3] })
    .do({ type: 'close batch', batch: 'b1' })
    .open('b2', 2);
  const row = summaryRow(script.batch('b1'));
  if (!row) throw new Error('not closed');
  const day = Date.UTC(2026, 0, 12);
  const summary = shiftOf([row], [script.batch('b2')], day, day + 24 * 3_600_000);
  return { script, row, summary, context: { wide: script.bench.wide, words: en, offsetMinutesAt: utc } };
}

describe('the shift in words', () => {
  test('one sentence, as reckoned by hand', () => {
    const { summary, context } = shift();
    // Wilson, 95 %, of 2 in 4: 15.0 to 85.0 %.
    expect(shiftSentence(summary, context)).toBe(
      '2 of 4 right first time (50 %, 15 to 85); 1 scrapped; most sent back: scratch, 1.',
    );
  });

  test('four numbers, each with what it is out of', () => {
    const { summary, context } = shift();
    expect(shiftFigures(summary, context).map(({ value, unit, beneath }) => [value + unit, beneath[0]])).toEqual([
      ['3', '3 of 6 that were in work'],
      ['50%', '2 of 4 finished'],
      ['1', '1 of 4 finished'],
      ['2', '2 of 6 that were in work'],
    ]);
  });

  test('a ratio of nothing is "-"', () => {
    const { context } = shift();
    const nothing = shiftOf([], [], 0, 1);
    expect(shiftSentence(nothing, context)).toBe('Nothing finished.');
    expect(shiftFigures(nothing, context)[1]).toMatchObject({ value: '-', unit: '', beneath: ['0 of 0 finished'] });
    expect(cycleView(nothing.cycle.passed, en)).toBeNull();
  });

  test('by recipe, and causes by their names', () => {
    const { summary, context } = shift();
    expect(recipeRows(summary, context)).toMatchObject([{ name: 'Small, rev A' }]);
    expect(
      recipeRows(summary, context)[0]
        ?.cells.map(({ text }) => text)
        .slice(0, 4),
    ).toEqual(['3', '2/4, 50 %', '1', '2']);
    expect(causes(summary.sendBacks, context)).toEqual([{ name: 'Scratch', count: 1 }]);
    expect(causes([{ defect: 'unheard-of', connectors: 1 }], context)).toEqual([{ name: 'unheard-of', count: 1 }]);
  });

  test('the parts of the average cycle add up to the whole', () => {
    const { summary } = shift();
    const cycle = summary.cycle.passed;
    const view = cycleView(cycle, en);
    const sum = view?.parts.reduce((total, { value }) => total + value, 0) ?? 0;
    expect(sum).toBeCloseTo((cycle?.total.sumMs ?? NaN) / 3, 6);
    expect(view?.rows.map(({ name }) => name)).toHaveLength(4);
  });
});

describe('clocks that ended', () => {
  test('how late, why, and how soon their alarm was seen', () => {
    const { row, context } = shift();
    const batches = new Map([['b1', { hash: row.recipe.hash, workOrder: 'WO b1' }]]);
    const base = row.lateness[0];
    if (!base) throw new Error('no clock');
    const views = latenessViews(
      [
        { ...base, lateS: 0.4, verdict: 'in time', seenLateS: null },
        { ...base, lateS: 240, verdict: 'in time', seenLateS: 75 },
        { ...base, lateS: -180, verdict: 'early', reason: 'Lead agreed', seenLateS: 0 },
        { ...base, clock: { kind: 'working life', mix: null }, step: 'fill', lateS: 300, verdict: 'over' },
      ],
      batches,
      context,
    );
    expect(views.map(({ text }) => text)).toEqual([
      'on time',
      '4 min after it was due; alarm seen after 75 s',
      '3 min too early; alarm seen at once',
      'used 5 min after it was over',
    ]);
    expect(views.map(({ reason }) => reason)).toEqual([null, null, 'Reason: Lead agreed', null]);
    expect(views[0]?.title).toBe('Cure · WO b1 · 4 connectors');
    expect(views[3]?.title).toBe('Working life, Fill and insert · WO b1 · 4 connectors');
  });
});

describe('which shift', () => {
  const hours = [
    { name: 'Early', from: '06:00', to: '14:00' },
    { name: 'Late', from: '14:00', to: '22:00' },
  ];
  const names = (at: string, shifts = hours) =>
    shiftChoices(shifts, Date.parse(at), utc).map((window) => windowName(window, en));

  test('this one and the one before', () => {
    expect(names('2026-03-03T15:00Z')).toEqual(['Late', 'Early']);
  });

  test('where the one before is only a gap, the shift before that too', () => {
    expect(names('2026-03-03T06:05Z')).toEqual(['Early', 'Between shifts', 'Late']);
  });

  test('whole days without shift hours, also where a day has 23 hours', () => {
    expect(names('2026-03-03T06:05Z', [])).toEqual(['Whole day', 'Whole day']);
    const berlin = zone('Europe/Berlin');
    const [day] = shiftChoices([], Date.parse('2026-03-29T12:00Z'), berlin);
    expect(day && windowName(day, en)).toBe('Whole day');
    expect(day && windowHours(day, { ...shift().context, offsetMinutesAt: berlin })).toBe('2026-03-29, 00:00 to 24:00');
  });
});
