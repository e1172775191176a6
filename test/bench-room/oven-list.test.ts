import { describe, expect, test } from 'vitest';
import { showTimeAt } from '../../src/bench/clock-words.ts';
import { ovenCards, ovenUndo } from '../../src/bench/oven-list.ts';
import { wrongTap } from '../../src/core/command/decide-void.ts';
import { en } from '../../src/words/en.ts';
import { Script } from '../fake/script.ts';
import { filled } from './small-batches.ts';

const cards = (script: Script) => ovenCards({ bench: script.bench, words: en, time: showTimeAt(script.now, 0) });
const oven = (script: Script) => cards(script)[0];
const set = (script: Script) =>
  script.do({ type: 'set oven', oven: 'o1', name: 'Oven 1', setPointC: 100, warmUpS: 450 });

describe('ovens', () => {
  test('setting, reading and who is in it', () => {
    const script = set(new Script()).wait(600);
    script.do({ type: 'read oven', oven: 'o1', temperatureC: 98.5 });
    expect(oven(script)).toMatchObject({
      setting: 'Set to 100 °C, warm-up 7.5 min, set at 06:00',
      reading: 'Read 98.5 °C at 06:10',
      wants: null,
      loads: [],
    });
    filled(script, 'b1', 3).do({
      type: 'start load',
      batch: 'b1',
      step: 'cure',
      load: 'l1',
      station: 'o1',
      connectors: [1, 2],
    });
    expect(oven(script)?.loads).toMatchObject([{ batch: 'b1', connectors: 2, tag: { number: 1 } }]);
  });

  test('an opened door wants a reading, a power cut wants a setting, also after a reading', () => {
    const script = set(new Script());
    script.do({ type: 'disturb oven', oven: 'o1', what: 'door opened' });
    expect(oven(script)?.wants).toBe('Door opened at 06:00. Enter a reading.');
    script.do({ type: 'read oven', oven: 'o1', temperatureC: 90 });
    expect(oven(script)?.wants).toBeNull();
    script.do({ type: 'disturb oven', oven: 'o1', what: 'power cut' });
    script.do({ type: 'read oven', oven: 'o1', temperatureC: 80 });
    expect(oven(script)?.wants).toBe('Power cut at 06:00. Set it anew.');
    expect(oven(set(script))?.wants).toBeNull();
  });

  test('the latest entry that still stands can be taken back, one after the other', () => {
    const script = set(new Script());
    script.do({ type: 'read oven', oven: 'o1', temperatureC: 98 });
    const labels: (string | undefined)[] = [];
    for (let times = 0; times < 3; times += 1) {
      const undo = ovenUndo(script.bench, en);
      labels.push(undo?.label);
      if (undo) {
        script.do({ type: 'void', batch: 'bench', targets: [undo.entry], reason: wrongTap, andWhatRests: false });
      }
    }
    expect(labels[0]).toBe('Undo 98 °C, Oven 1');
    expect(labels[1]).toMatch(/^Undo setting/);
    expect(labels[2]).toBeUndefined();
    expect(cards(script)).toEqual([]);
  });
});
