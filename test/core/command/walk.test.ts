import { describe, expect, it } from 'vitest';
import { from, Script } from '../../fake/script.ts';

const refusal = (decision: ReturnType<Script['try']>) => (decision.ok ? null : decision.error);

/** A batch filled and ready for the oven. */
export const filled = (script: Script, batch: string, count: number): Script =>
  script
    .open(batch, count)
    .do({ type: 'finish step', batch, step: 'strip', connectors: from(1, count) })
    .do({ type: 'mix adhesive', batch, connectors: from(1, count), mix: `mix-${batch}`, lot: 'A-1', roomC: 23 })
    .do({ type: 'finish step', batch, step: 'fill', connectors: from(1, count) });

/** The same, cured for its 20 minutes and cooled. */
export const cooled = (script: Script, batch: string, count: number): Script =>
  filled(script, batch, count)
    .do({ type: 'start load', batch, step: 'cure', load: `oven-${batch}`, station: '', connectors: from(1, count) })
    .wait(1200)
    .do({ type: 'end load', batch, load: `oven-${batch}`, nextLoad: `cool-${batch}` })
    .wait(600)
    .do({ type: 'end load', batch, load: `cool-${batch}`, nextLoad: 'none' });

describe('a batch from strip to passed', () => {
  it('walks every step, and closes when no connector is left', () => {
    const script = cooled(new Script(), 'b1', 4);
    script
      .do({ type: 'start load', batch: 'b1', step: 'film-1', load: 'f1', station: '', connectors: from(1, 4) })
      .wait(60)
      .do({ type: 'end load', batch: 'b1', load: 'f1', nextLoad: 'none' })
      .do({ type: 'pass', batch: 'b1', step: 'inspect', connectors: from(1, 4) });
    expect(refusal(script.try({ type: 'close batch', batch: 'b1' }))).toEqual({
      code: 'connectors unfinished',
      count: 4,
    });
    script
      .do({ type: 'pass', batch: 'b1', step: 'measure', connectors: from(1, 4) })
      .do({ type: 'close batch', batch: 'b1' });
    const batch = script.batch('b1');
    expect(batch.connectors.map((one) => one.stands.at)).toEqual(['passed', 'passed', 'passed', 'passed']);
    expect(batch.closed?.how).toBe('complete');
    expect(batch.misfits).toEqual([]);
  });

  it('starts the cool-down with the same tap that ends the cure', () => {
    const script = filled(new Script(), 'b1', 2)
      .do({ type: 'start load', batch: 'b1', step: 'cure', load: 'l1', station: '', connectors: [1, 2] })
      .wait(1200)
      .do({ type: 'end load', batch: 'b1', load: 'l1', nextLoad: 'l2' });
    expect(script.batch('b1').loads.map(({ id, step }) => [id, step])).toEqual([
      ['l1', 3],
      ['l2', 4],
    ]);
  });

  it('refuses a step that lies ahead of where the connectors stand', () => {
    const script = new Script().open('b1', 3);
    expect(refusal(script.try({ type: 'finish step', batch: 'b1', step: 'fill', connectors: [2] }))).toEqual({
      code: 'not at this step',
      numbers: [2],
    });
  });

  it('takes a part of the batch and leaves the rest where it stands', () => {
    const script = new Script().open('b1', 3);
    script.do({ type: 'finish step', batch: 'b1', step: 'strip', connectors: [1, 3] });
    expect(script.batch('b1').connectors.map(({ stands }) => 'step' in stands && stands.step)).toEqual([1, 0, 1]);
  });
});

describe('time that must not be cut short', () => {
  it('takes a tray out early only with a reason, and freezes dose and lateness', () => {
    const script = filled(new Script(), 'b1', 2)
      .do({ type: 'start load', batch: 'b1', step: 'cure', load: 'l1', station: '', connectors: [1, 2] })
      .wait(600);
    const early = script.try({ type: 'end load', batch: 'b1', load: 'l1', nextLoad: 'l2' });
    expect(refusal(early)).toMatchObject({ code: 'too early' });
    script.do({ type: 'end load', batch: 'b1', load: 'l1', nextLoad: 'l2', reason: 'oven needed' });
    const ended = script.batch('b1').loads[0]?.ended;
    expect(ended).toMatchObject({ verdict: 'early', reason: 'oven needed', dose: 0.5, lateS: -600 });
  });

  it('asks why when the tray stayed past the longest dose', () => {
    const script = filled(new Script(), 'b1', 1)
      .do({ type: 'start load', batch: 'b1', step: 'cure', load: 'l1', station: '', connectors: [1] })
      .wait(3 * 1200 + 60);
    const late = script.try({ type: 'end load', batch: 'b1', load: 'l1', nextLoad: 'l2' });
    expect(refusal(late)).toMatchObject({ code: 'too late', lateS: 2460 });
  });

  it('asks why when adhesive is used past its working life', () => {
    const script = new Script()
      .open('b1', 2)
      .do({ type: 'finish step', batch: 'b1', step: 'strip', connectors: [1, 2] })
      .do({ type: 'mix adhesive', batch: 'b1', connectors: [1, 2], mix: 'm1', lot: 'A-1', roomC: null })
      .wait(3610);
    const over = script.try({ type: 'finish step', batch: 'b1', step: 'fill', connectors: [1, 2] });
    expect(refusal(over)).toEqual({ code: 'working life over', lateS: 10 });
    script.do({ type: 'finish step', batch: 'b1', step: 'fill', connectors: [1, 2], overrunReason: 'lead agreed' });
    const finished = script.batch('b1').connectors[0]?.history.at(-1);
    expect(finished).toMatchObject({ kind: 'finished', overrunS: 10 });
  });
});

describe('what is shared', () => {
  it('puts two batches into one oven load and takes them out one by one', () => {
    const script = filled(filled(new Script(), 'b1', 2), 'b2', 3)
      .do({ type: 'start load', batch: 'b1', step: 'cure', load: 'tray', station: '', connectors: [1, 2] })
      .do({ type: 'start load', batch: 'b2', step: 'cure', load: 'tray', station: '', connectors: [1, 2, 3] })
      .wait(1200)
      .do({ type: 'end load', batch: 'b1', load: 'tray', nextLoad: 'c1' });
    expect(script.batch('b1').loads[0]?.ended?.verdict).toBe('in time');
    expect(script.batch('b2').loads[0]?.ended).toBeNull();
  });

  it('lets one batch go through the oven in two loads', () => {
    const script = filled(new Script(), 'b1', 4)
      .do({ type: 'start load', batch: 'b1', step: 'cure', load: 'l1', station: '', connectors: [1, 2] })
      .wait(300)
      .do({ type: 'start load', batch: 'b1', step: 'cure', load: 'l2', station: '', connectors: [3, 4] })
      .wait(900)
      .do({ type: 'end load', batch: 'b1', load: 'l1', nextLoad: 'c1' });
    expect(refusal(script.try({ type: 'end load', batch: 'b1', load: 'l2', nextLoad: 'c2' }))).toMatchObject({
      code: 'too early',
    });
    expect(script.batch('b1').connectors.map(({ stands }) => stands.at === 'load' && stands.load)).toEqual([
      'c1',
      'c1',
      'l2',
      'l2',
    ]);
  });

  it('takes a second mix in the middle of a batch, for the connectors that are not filled yet', () => {
    const script = new Script()
      .open('b1', 3)
      .do({ type: 'finish step', batch: 'b1', step: 'strip', connectors: from(1, 3) })
      .do({ type: 'mix adhesive', batch: 'b1', connectors: from(1, 3), mix: 'm1', lot: 'A-1', roomC: 22 })
      .do({ type: 'finish step', batch: 'b1', step: 'fill', connectors: [1] })
      .wait(3700)
      .do({ type: 'mix adhesive', batch: 'b1', connectors: [2, 3], mix: 'm2', lot: 'A-2', roomC: 22 })
      .do({ type: 'finish step', batch: 'b1', step: 'fill', connectors: [2, 3] });
    expect(script.batch('b1').connectors.map(({ mixSeen }) => mixSeen)).toEqual(['m1', 'm2', 'm2']);
    expect(script.batch('b1').connectors.every(({ mix }) => mix === null)).toBe(true);
  });

  it('lets another batch use the same mix while it lasts, not after', () => {
    const script = filled(new Script(), 'b1', 1).open('b2', 2);
    script
      .do({ type: 'finish step', batch: 'b2', step: 'strip', connectors: [1, 2] })
      .do({ type: 'use mix', batch: 'b2', connectors: [1], mix: 'mix-b1' })
      .wait(3601);
    expect(refusal(script.try({ type: 'use mix', batch: 'b2', connectors: [2], mix: 'mix-b1' }))).toMatchObject({
      code: 'mix is over',
    });
  });
});

describe('late entries', () => {
  it('counts a step from when it happened, and keeps both times', () => {
    const script = new Script().open('b1', 1).wait(1800);
    const late = { agoS: 1200, reason: 'gloves on, tablet asleep' };
    script.do({ type: 'finish step', batch: 'b1', step: 'strip', connectors: [1], late });
    const trace = script.batch('b1').traces.at(-1);
    expect((trace?.entered.bench ?? 0) - (trace?.at.bench ?? 0)).toBe(1200_000);
    expect(script.batch('b1').connectors[0]?.since).toEqual(trace?.at);
  });

  it('is not before what it follows', () => {
    const script = new Script().open('b1', 1).wait(60);
    const late = { agoS: 100, reason: '' };
    expect(refusal(script.try({ type: 'finish step', batch: 'b1', step: 'strip', connectors: [1], late }))).toEqual({
      code: 'earlier than what it follows',
    });
  });

  it('asks for a reason past two minutes and refuses more than a shift', () => {
    const script = new Script().open('b1', 1).wait(90_000);
    const step = { type: 'finish step', batch: 'b1', step: 'strip', connectors: [1] } as const;
    expect(refusal(script.try({ ...step, late: { agoS: 121, reason: ' ' } }))).toEqual({ code: 'ago needs a reason' });
    expect(refusal(script.try({ ...step, late: { agoS: 50_000, reason: 'x' } }))).toMatchObject({
      code: 'ago out of range',
    });
  });

  it('started a cure 20 minutes ago: the clock runs from then', () => {
    const script = filled(new Script(), 'b1', 1).wait(1300);
    const late = { agoS: 1200, reason: 'forgot to tap' };
    script.do({ type: 'start load', batch: 'b1', step: 'cure', load: 'l', station: '', connectors: [1], late });
    script.do({ type: 'end load', batch: 'b1', load: 'l', nextLoad: 'c' });
    expect(script.batch('b1').loads[0]?.ended?.verdict).toBe('in time');
  });
});

describe('trouble', () => {
  const atInspect = (script: Script, batch: string, count: number) =>
    cooled(script, batch, count)
      .do({ type: 'start load', batch, step: 'film-1', load: `f-${batch}`, station: '', connectors: from(1, count) })
      .wait(60)
      .do({ type: 'end load', batch, load: `f-${batch}`, nextLoad: 'none' });

  it('sends one connector back to the film, which rejoins with its attempt kept', () => {
    const script = atInspect(new Script(), 'b1', 3);
    script.do({ type: 'send back', batch: 'b1', connectors: [2], to: 'film-1', defect: 'scratch' });
    const sent = script.batch('b1').connectors[1];
    expect(sent).toMatchObject({ attempt: 1, reworks: 1, stands: { at: 'step', step: 5 } });
    expect(sent?.history.map(({ kind }) => kind).slice(-2)).toEqual(['judged', 'sent back']);
  });

  it('begins anew with the next attempt when cut off after the cure', () => {
    const script = atInspect(new Script(), 'b1', 2);
    script.do({ type: 'send back', batch: 'b1', connectors: [1], to: 'strip', defect: 'crack' });
    expect(script.batch('b1').connectors[0]).toMatchObject({ attempt: 2, reworks: 0, mix: null });
  });

  it('never polishes out a crack (NASA-STD-8739.5A)', () => {
    const script = atInspect(new Script(), 'b1', 1);
    const polish = script.try({ type: 'send back', batch: 'b1', connectors: [1], to: 'film-1', defect: 'crack' });
    expect(refusal(polish)).toEqual({ code: 'crack is not polished out' });
  });

  it('keeps to the limit on repolishing', () => {
    const script = atInspect(new Script(), 'b1', 1);
    for (const load of ['r1', 'r2']) {
      script
        .do({ type: 'send back', batch: 'b1', connectors: [1], to: 'film-1', defect: 'scratch' })
        .do({ type: 'start load', batch: 'b1', step: 'film-1', load, station: '', connectors: [1] })
        .wait(60)
        .do({ type: 'end load', batch: 'b1', load, nextLoad: 'none' });
    }
    const third = script.try({ type: 'send back', batch: 'b1', connectors: [1], to: 'film-1', defect: 'scratch' });
    expect(refusal(third)).toEqual({ code: 'repolish limit', numbers: [1], most: 2 });
  });

  it('takes a connector out of a running load, and ends a load that is empty', () => {
    const script = cooled(new Script(), 'b1', 2).do({
      type: 'start load',
      batch: 'b1',
      step: 'film-1',
      load: 'f',
      station: '',
      connectors: [1, 2],
    });
    script.do({ type: 'scrap', batch: 'b1', connectors: [1], defect: 'crack' });
    expect(script.batch('b1').loads.at(-1)?.ended).toBeNull();
    script.do({ type: 'scrap', batch: 'b1', connectors: [2], defect: 'crack' });
    expect(script.batch('b1').loads.at(-1)?.ended).toMatchObject({ verdict: 'early' });
  });

  it('ends a batch short: the rest is scrapped with the cause', () => {
    const script = atInspect(new Script(), 'b1', 3);
    script
      .do({ type: 'pass', batch: 'b1', step: 'inspect', connectors: [1] })
      .do({ type: 'pass', batch: 'b1', step: 'measure', connectors: [1] })
      .do({ type: 'end batch short', batch: 'b1', defect: 'crack' });
    expect(script.batch('b1').connectors.map(({ stands }) => stands.at)).toEqual(['passed', 'scrapped', 'scrapped']);
  });

  it('a held batch takes no step, but lets its tray out of the oven', () => {
    const script = filled(new Script(), 'b1', 1)
      .do({ type: 'start load', batch: 'b1', step: 'cure', load: 'l', station: '', connectors: [1] })
      .do({ type: 'hold batch', batch: 'b1', reason: 'lot in question' })
      .wait(1200)
      .do({ type: 'end load', batch: 'b1', load: 'l', nextLoad: 'c' });
    const started = script.try({
      type: 'start load',
      batch: 'b1',
      step: 'cool',
      load: 'c',
      station: '',
      connectors: [1],
    });
    expect(refusal(started)).toEqual({ code: 'batch is held', reason: 'lot in question' });
    script.do({ type: 'resume batch', batch: 'b1' });
    expect(script.batch('b1').held).toBeNull();
  });
});

describe('taking back', () => {
  it('undoes the last command with all its entries', () => {
    const script = filled(new Script(), 'b1', 2)
      .do({ type: 'start load', batch: 'b1', step: 'cure', load: 'l', station: '', connectors: [1, 2] })
      .wait(1200)
      .do({ type: 'end load', batch: 'b1', load: 'l', nextLoad: 'c' })
      .do({ type: 'undo', batch: 'b1' });
    expect(script.batch('b1').loads.map(({ id, ended }) => [id, ended])).toEqual([['l', null]]);
  });

  it('takes a mix back with the step that took it, unless another batch took it too', () => {
    const script = new Script().open('b1', 1);
    script
      .do({ type: 'finish step', batch: 'b1', step: 'strip', connectors: [1] })
      .do({ type: 'mix adhesive', batch: 'b1', connectors: [1], mix: 'm1', lot: 'A-1', roomC: null })
      .do({ type: 'undo', batch: 'b1' });
    expect(script.bench.wide.mixes).toEqual({});
    expect(script.batch('b1').connectors[0]?.stands).toEqual({ at: 'step', step: 1 });
  });

  it('names what rests on an entry, and takes the whole list when asked', () => {
    const script = filled(new Script(), 'b1', 1);
    const strip = script.batch('b1').traces.find(({ type }) => type === 'stepFinished');
    const target = { log: strip?.entry.log ?? '', seq: strip?.entry.seq ?? 0 };
    const command = { type: 'void', batch: 'b1', targets: [target], reason: 'wrong batch' } as const;
    const refused = refusal(script.try({ ...command, andWhatRests: false }));
    expect(refused?.code === 'others rest on it' && refused.resting.length).toBe(2);
    script.do({ ...command, andWhatRests: true });
    expect(script.batch('b1').connectors[0]?.stands).toEqual({ at: 'step', step: 0 });
    expect(script.batch('b1').misfits).toEqual([]);
  });

  it('reopens a closed batch, with another tag where its own is taken', () => {
    const script = new Script().open('b1', 1);
    script
      .do({ type: 'scrap', batch: 'b1', connectors: [1], defect: 'crack' })
      .do({ type: 'close batch', batch: 'b1' })
      .open('b2', 1)
      .do({ type: 'reopen batch', batch: 'b1' });
    expect([script.batch('b1').closed, script.batch('b1').tag, script.batch('b2').tag]).toEqual([null, 2, 1]);
  });
});

describe('a new batch', () => {
  it.each([0, 1001])('refuses %i connectors', (count) => {
    const script = new Script().open('b0', 1);
    const text = JSON.stringify(script.batch('b0').recipe);
    const decision = script.try({
      type: 'open batch',
      batch: 'b1',
      tag: null,
      workOrder: 'WO',
      recipeText: text,
      connectors: Array.from({ length: count }, () => ({})),
    });
    expect(refusal(decision)).toMatchObject({ code: 'connectors out of range', found: count });
  });

  it('refuses a thirteenth batch in words, since all tags are in use', () => {
    const script = new Script();
    for (let batch = 1; batch <= 12; batch += 1) script.open(`b${batch}`, 1);
    expect(() => script.open('b13', 1)).toThrow('no tag free');
  });

  it('keeps markup in a work order as the text that it is, and refuses 300 characters', () => {
    const script = new Script().open('b0', 1);
    const text = JSON.stringify(script.batch('b0').recipe);
    const open = { type: 'open batch', tag: null, recipeText: text, connectors: [{}] } as const;
    script.do({ ...open, batch: 'b1', workOrder: '<b>4471</b>' });
    expect(script.batch('b1').workOrder).toBe('<b>4471</b>');
    const long = script.try({ ...open, batch: 'b2', workOrder: 'x'.repeat(300) });
    expect(refusal(long)).toEqual({ code: 'text too long', field: 'work order', length: 300, most: 80 });
  });

  it('keeps the recipe revision that it began with', () => {
    const script = new Script();
    script.open('b1', 1);
    const revised = { ...script.batch('b1').recipe, revision: 'B' };
    const both = new Script({ recipes: [script.batch('b1').recipe, revised] });
    both.open('b1', 1).open('b2', 1, revised);
    expect([both.batch('b1').recipe.revision, both.batch('b2').recipe.revision]).toEqual(['A', 'B']);
  });
});
