import { describe, expect, it } from 'vitest';
import { inOrder } from '../../../src/core/event/order.ts';
import { foldBench } from '../../../src/core/batch/fold.ts';
import { Script } from '../../fake/script.ts';
import { smallRecipe } from '../../fake/small-recipe.ts';

const readRecipe = (text: string) => (text === JSON.stringify(smallRecipe) ? smallRecipe : null);
const hourMs = 3_600_000;
const noon = Date.UTC(2026, 0, 12, 12, 0, 0);

/** A batch begun on one tablet, taken over by another whose clock differs. */
function takenOver(clockDifferenceMs: number): Script {
  const first = new Script({ log: 'log-a', wall: noon }).open('b1', 2);
  return new Script({ log: 'log-b', wall: noon + clockDifferenceMs, entries: first.entries });
}

describe('two tablets', () => {
  it.each([-hourMs, -1000, 0, 1000, hourMs])('whose clocks differ by %i ms lose no entry', (difference) => {
    const second = takenOver(difference);
    second
      .do({ type: 'finish step', batch: 'b1', step: 'strip', connectors: [1, 2] })
      .wait(30)
      .do({ type: 'mix adhesive', batch: 'b1', connectors: [1, 2], mix: 'm1', lot: 'A', roomC: null })
      .wait(30)
      .do({ type: 'finish step', batch: 'b1', step: 'fill', connectors: [1, 2] });
    expect(second.batch('b1').misfits).toEqual([]);
    expect(second.batch('b1').connectors.map(({ stands }) => stands)).toEqual([
      { at: 'step', step: 3 },
      { at: 'step', step: 3 },
    ]);
  });

  it('give the same bench in whichever order their entries arrive', () => {
    const second = takenOver(-hourMs).do({ type: 'finish step', batch: 'b1', step: 'strip', connectors: [1] });
    const forwards = foldBench(inOrder(second.entries), readRecipe);
    expect(foldBench(inOrder(second.entries.toReversed()), readRecipe)).toEqual(forwards);
  });
});

describe('a start with the clock behind the last entry', () => {
  const restarted = () => {
    const script = new Script({ wall: noon })
      .open('b1', 1)
      .do({ type: 'finish step', batch: 'b1', step: 'strip', connectors: [1] })
      .do({ type: 'mix adhesive', batch: 'b1', connectors: [1], mix: 'm1', lot: 'A', roomC: null });
    script.wall -= hourMs;
    script.write([{ batch: 'bench', type: 'tabletStarted', v: 1, data: { app: 'test' } }]);
    return script;
  };

  it('leaves a gap of unknown length: no limited step is finished until it is stated', () => {
    const script = restarted();
    const fill = { type: 'finish step', batch: 'b1', step: 'fill', connectors: [1] } as const;
    const refused = script.try(fill);
    expect(refused.ok ? null : refused.error.code).toBe('time unknown');
    script.do({ type: 'state time', addedS: 600 });
    script.do(fill);
    expect(script.batch('b1').connectors[0]?.stands).toEqual({ at: 'step', step: 3 });
  });

  it('counts what was stated', () => {
    const script = restarted().do({ type: 'state time', addedS: 4000 });
    const refused = script.try({ type: 'finish step', batch: 'b1', step: 'fill', connectors: [1] });
    expect(refused.ok ? null : refused.error).toEqual({ code: 'working life over', lateS: 400 });
  });
});
