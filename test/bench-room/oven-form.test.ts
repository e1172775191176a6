import { describe, expect, test } from 'vitest';
import { emptyForm, needsReason, ovenCommand, ovenFieldOf, type OvenAsk } from '../../src/bench/oven-form.ts';
import { en } from '../../src/words/en.ts';
import { Script } from '../fake/script.ts';

const script = new Script().do({ type: 'set oven', oven: 'o1', name: 'Oven 1', setPointC: 100, warmUpS: 600 });
const oven = script.bench.wide.ovens['o1'];
if (!oven) throw new Error('no oven');
const add: OvenAsk = { kind: 'add', oven: 'o2' };
const read: OvenAsk = { kind: 'read', oven };
const disturb: OvenAsk = { kind: 'disturb', oven };

describe('what is typed about an oven', () => {
  test('a decimal comma is a decimal point, an empty warm-up is not measured', () => {
    const form = { ...emptyForm(add), name: 'Block', setPoint: '98,5' };
    expect(ovenCommand(add, form, en)).toEqual({
      ok: true,
      value: { type: 'set oven', oven: 'o2', name: 'Block', setPointC: 98.5, warmUpS: null },
    });
  });

  test('setting anew begins with what was set', () => {
    expect(emptyForm({ kind: 'set', oven })).toMatchObject({ name: 'Oven 1', setPoint: '100', warmUp: '10' });
  });

  test('every field that cannot be read has its sentence', () => {
    const form = { ...emptyForm(add), setPoint: 'hot', warmUp: '1.000,5', minutesAgo: '-3' };
    const command = ovenCommand(add, form, en);
    expect(command.ok).toBe(false);
    expect(command.ok ? {} : command.error).toEqual({
      setPoint: '“hot” is no number of °C.',
      warmUp: expect.stringContaining('1.000,5') as string,
      minutesAgo: 'At least 0 min.',
    });
  });

  test('1000 °C is refused at its field, and nothing is written', () => {
    const command = ovenCommand(read, { ...emptyForm(read), reading: '1000' }, en);
    if (!command.ok) throw new Error('must be decided, not parsed');
    const entries = script.entries.length;
    const decision = script.try(command.value);
    expect(script.entries).toHaveLength(entries);
    if (decision.ok) throw new Error('1000 °C was taken');
    expect(ovenFieldOf(decision.error, read)).toBe('reading');
    expect(decision.error.code).toBe('temperature out of range');
  });

  test('a late entry carries its seconds, and past two minutes its reason', () => {
    expect(needsReason('2')).toBe(false);
    expect(needsReason('2,5')).toBe(true);
    const form = { ...emptyForm(disturb), what: 'power cut' as const, minutesAgo: '2,5', reason: 'busy' };
    expect(ovenCommand(disturb, form, en)).toMatchObject({
      value: { type: 'disturb oven', what: 'power cut', late: { agoS: 150, reason: 'busy' } },
    });
    const without = ovenCommand(disturb, { ...form, reason: ' ' }, en);
    const refused = without.ok ? script.try(without.value) : null;
    expect(refused?.ok === false && ovenFieldOf(refused.error, disturb)).toBe('reason');
  });

  test('what happened earlier says when', () => {
    expect(ovenCommand(disturb, emptyForm(disturb), en)).toMatchObject({ ok: false });
  });
});
