import { describe, expect, it } from 'vitest';
import { foldWide } from '../../../src/core/batch/fold.ts';
import type { BenchWide } from '../../../src/core/batch/types.ts';
import { Script } from '../../fake/script.ts';

const readRecipe = () => null;

/** A bench with a mix, an oven that was read, and an entry that did not fit. */
function written(): Script {
  const script = new Script();
  script.do({ type: 'set oven', oven: 'o1', name: 'Oven 1', setPointC: 100, warmUpS: null });
  script.do({ type: 'read oven', oven: 'o1', temperatureC: 98 });
  script.write([
    {
      batch: 'bench',
      type: 'adhesiveMixed',
      v: 1,
      data: { mix: 'm1', adhesive: 'A', lot: 'L', roomC: 22, workingLifeS: 60 },
    },
    { batch: 'bench', type: 'recipeTaken', v: 1, data: { hash: '0'.repeat(64), text: 'no recipe' } },
  ]);
  return script;
}

const frozen = (wide: BenchWide): BenchWide => {
  const freeze = (value: unknown): void => {
    if (typeof value !== 'object' || value === null || Object.isFrozen(value)) return;
    Object.freeze(value);
    Object.values(value).forEach(freeze);
  };
  freeze(wide);
  return wide;
};

describe('bench-wide state that is continued', () => {
  it('leaves what it continues from as it was', () => {
    const script = written();
    const before = script.entries.length;
    script.do({ type: 'read oven', oven: 'o1', temperatureC: 99 });
    script.do({ type: 'read oven', oven: 'o1', temperatureC: 97, late: { agoS: 60, reason: '' } });
    script.write([
      { batch: 'bench', type: 'clockSeen', v: 1, data: { clock: 'c1', lateS: 3 } },
      { batch: 'bench', type: 'recipeTaken', v: 1, data: { hash: '1'.repeat(64), text: 'none either' } },
    ]);
    const from = frozen(foldWide(script.entries.slice(0, before), readRecipe));
    const whole = foldWide(script.entries.slice(before), readRecipe, from);
    expect(whole).toEqual(foldWide(script.entries, readRecipe));
    expect(from.ovens['o1']?.history).toHaveLength(2);
    expect(whole.ovens['o1']?.history).toHaveLength(4);
    expect(whole.misfits).toHaveLength(2);
  });

  it('keeps a register that did not change as the same object, by which others tell', () => {
    const script = written();
    const before = script.entries.length;
    script.do({ type: 'read oven', oven: 'o1', temperatureC: 99 });
    const from = foldWide(script.entries.slice(0, before), readRecipe);
    const next = foldWide(script.entries.slice(before), readRecipe, from);
    expect(next.ovens).not.toBe(from.ovens);
    for (const register of ['recipes', 'mixes', 'seen', 'misfits'] as const) {
      expect(next[register], register).toBe(from[register]);
    }
  });
});
