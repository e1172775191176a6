import { describe, expect, test } from 'vitest';
import {
  changeShift,
  clockTyped,
  draftOf,
  mostOperators,
  refusedAt,
  sameDraft,
  setBenchCommand,
  withOperator,
  withoutOperator,
  withoutShift,
  withShift,
  type BenchDraft,
} from '../../src/bench/settings-draft.ts';
import { bytesText } from '../../src/bench/settings-device.ts';
import { updateHindrance } from '../../src/bench/settings-update.ts';
import { decideSetBench } from '../../src/core/command/decide-bench.ts';
import { factSchema } from '../../src/core/event/facts.ts';
import { clocks } from '../../src/core/timer/clocks.ts';
import { readClock } from '../../src/core/timer/reading.ts';
import { Script } from '../fake/script.ts';
import { cooled, filled } from './small-batches.ts';

const draft: BenchDraft = {
  tablet: 'Bench 2',
  operators: ['MK'],
  shifts: [{ name: 'Early', from: '06:00', to: '14:00' }],
};
const refusalOf = (wrong: BenchDraft) => {
  const decision = decideSetBench(setBenchCommand(wrong));
  if (decision.ok) throw new Error('was taken');
  return decision.error;
};

describe('tablet, people and shifts as they are typed', () => {
  test.each([
    ['6', '06:00'],
    ['6:30', '06:30'],
    ['0630', '06:30'],
    ['630', '06:30'],
    [' 22.15 ', '22:15'],
    ['noon', 'noon'],
    ['', ''],
  ])('"%s" is the time %s', (typed, time) => expect(clockTyped(typed)).toBe(time));

  test('initials are kept in capitals; unfit and repeated ones are refused as saving would', () => {
    const added = withOperator(draft, ' jt ');
    expect(added.ok && added.value.operators).toEqual(['MK', 'JT']);
    const codes = ['mk', 'toolong', '1a', '<b>'].map((typed) => {
      const refused = withOperator(draft, typed);
      return refused.ok ? null : refused.error.code;
    });
    expect(codes).toEqual(['initials twice', 'initials unfit', 'initials unfit', 'initials unfit']);
    expect(withoutOperator(draft, 'MK').operators).toEqual([]);
  });

  test('a shift is added, changed, removed, and the draft told from what is kept', () => {
    const more = changeShift(withShift(draft), 1, { name: 'Late', from: '14', to: '22' });
    expect(setBenchCommand(more).shifts[1]).toEqual({ name: 'Late', from: '14:00', to: '22:00' });
    expect(sameDraft(more, draft)).toBe(false);
    expect(sameDraft(withoutShift(more, 1), draft)).toBe(true);
    expect(sameDraft({ ...draft, shifts: [{ name: ' Early', from: '6', to: '14' }] }, draft)).toBe(true);
  });

  test('each refusal is shown where it belongs', () => {
    expect(refusedAt(refusalOf({ ...draft, tablet: ' ' }), draft)).toEqual({ at: 'tablet' });
    const wrongTo = changeShift(withShift(draft), 1, { name: 'Late', from: '14:00', to: '25:00' });
    expect(refusedAt(refusalOf(wrongTo), wrongTo)).toEqual({ at: 'shift', place: 1, field: 'to' });
    const nameless = changeShift(withShift(draft), 1, { from: '14:00', to: '22:00' });
    expect(refusedAt(refusalOf(nameless), nameless)).toEqual({ at: 'shift', place: 1, field: 'name' });
    const long = changeShift(draft, 0, { name: 'x'.repeat(300) });
    expect(refusedAt(refusalOf(long), long)).toEqual({ at: 'shift', place: 0, field: 'name' });
  });

  test('as many people as fit on the page fit into one entry', () => {
    const operators = Array.from({ length: mostOperators }, (_, index) => `A${index}`);
    const data = { tablet: 'x', operators, shifts: [] };
    expect(factSchema.safeParse({ type: 'benchSet', v: 1, data }).success).toBe(true);
    const more = { ...data, operators: [...operators, 'B1'] };
    expect(factSchema.safeParse({ type: 'benchSet', v: 1, data: more }).success).toBe(false);
  });

  test('a saved draft comes back as it was', () => {
    const script = new Script().do(setBenchCommand(draft));
    expect(sameDraft(draftOf(script.bench.wide), draft)).toBe(true);
  });
});

describe('a new version waits while somebody is needed', () => {
  const hindrance = (script: Script) =>
    updateHindrance(
      clocks(script.bench).map((clock) => readClock(clock, script.now)),
      'saved',
    );
  const inOven = () =>
    filled(new Script(), 'b1', 2).do({
      type: 'start load',
      batch: 'b1',
      step: 'cure',
      load: 'l1',
      station: '',
      connectors: [1, 2],
    });

  test('not within 2 minutes of a clock, and not once it is due', () => {
    expect(hindrance(inOven().wait(1200 - 125))).toBeNull();
    expect(hindrance(inOven().wait(1200 - 119))).toBe('clock due');
    expect(hindrance(inOven().wait(1300))).toBe('clock due');
  });

  test('not while a film runs, however long it still has', () => {
    const script = cooled(new Script(), 'b1', 2);
    expect(hindrance(script)).toBeNull();
    script.do({ type: 'start load', batch: 'b1', step: 'film-1', load: 'f1', station: '', connectors: [1, 2] });
    expect(hindrance(script)).toBe('polish');
  });

  test('not while an entry is on its way or was not saved', () => {
    expect(updateHindrance([], 'saving')).toBe('not saved');
    expect(updateHindrance([], 'not saved')).toBe('not saved');
  });
});

test('room left is told in two figures at most', () => {
  expect([900, 1500, 3_200_000_000, 45e9].map(bytesText)).toEqual(['0.9 kB', '1.5 kB', '3.2 GB', '45 GB']);
});
