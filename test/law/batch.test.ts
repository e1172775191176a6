import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { foldBench, foldWide } from '../../src/core/batch/fold.ts';
import type { Batch, Connector } from '../../src/core/batch/types.ts';
import type { Command } from '../../src/core/command/commands.ts';
import type { Entry } from '../../src/core/event/entry.ts';
import { inOrder } from '../../src/core/event/order.ts';
import { Script } from '../fake/script.ts';
import { smallRecipe } from '../fake/small-recipe.ts';

/** Random wishes, sensible and not, of people at two tablets. */
const numbers = fc.uniqueArray(fc.integer({ min: 0, max: 6 }), { minLength: 0, maxLength: 5 });
const batch = fc.constantFrom('b1', 'b2', 'b3');
const step = fc.constantFrom(...smallRecipe.steps.map(({ id }) => id), 'nowhere');
const defect = fc.constantFrom('scratch', 'crack', 'high-loss', 'unheard-of');
const load = fc.constantFrom('l1', 'l2', 'l3', 'l4');
const late = fc.option(fc.record({ agoS: fc.integer({ min: -5, max: 4000 }), reason: fc.constantFrom('', 'late') }));
const reason = fc.constantFrom('', 'because');

type Wish = (script: Script, fresh: string) => Command;
const withLate = <T extends object>(command: T, lateness: { agoS: number; reason: string } | null): T =>
  lateness ? { ...command, late: lateness } : command;

/** Numbers that do stand somewhere the command could use are far likelier to lead on than chance is. */
const ready = (script: Script, id: string): { numbers: number[]; step: string } => {
  const found = script.bench.batches[id];
  const first = found?.connectors.find(({ stands }) => stands.at === 'step');
  const index = first?.stands.at === 'step' ? first.stands.step : 0;
  const same = found?.connectors.filter(({ stands }) => stands.at === 'step' && stands.step === index) ?? [];
  return { numbers: same.map((one) => one.number), step: smallRecipe.steps[index]?.id ?? 'strip' };
};

const onward =
  (id: string): Wish =>
  (script, fresh) => {
    const at = ready(script, id);
    const kind = smallRecipe.steps.find((one) => one.id === at.step)?.kind;
    const running = script.bench.batches[id]?.loads.find((one) => !one.ended);
    if (running) return { type: 'end load', batch: id, load: running.id, nextLoad: fresh, reason: 'onward' };
    if (kind === 'mix')
      return { type: 'mix adhesive', batch: id, connectors: at.numbers, mix: fresh, lot: 'A', roomC: 23 };
    if (kind === 'do')
      return { type: 'finish step', batch: id, step: at.step, connectors: at.numbers, overrunReason: 'onward' };
    if (kind === 'inspect' || kind === 'measure')
      return { type: 'pass', batch: id, step: at.step, connectors: at.numbers };
    return { type: 'start load', batch: id, step: at.step, load: fresh, station: '', connectors: at.numbers };
  };

const wish: fc.Arbitrary<Wish> = fc.oneof(
  { weight: 12, arbitrary: batch.map(onward) },
  {
    weight: 2,
    arbitrary: fc.tuple(batch, step, numbers, late).map(
      ([id, at, some, when]): Wish =>
        () =>
          withLate({ type: 'finish step', batch: id, step: at, connectors: some }, when),
    ),
  },
  {
    weight: 2,
    arbitrary: fc.tuple(batch, step, numbers, load, late).map(
      ([id, at, some, one, when]): Wish =>
        () =>
          withLate({ type: 'start load', batch: id, step: at, load: one, station: '', connectors: some }, when),
    ),
  },
  {
    weight: 2,
    arbitrary: fc.tuple(batch, load, reason, late).map(
      ([id, one, why, when]): Wish =>
        (_, fresh) =>
          withLate({ type: 'end load', batch: id, load: one, nextLoad: fresh, reason: why }, when),
    ),
  },
  {
    weight: 2,
    arbitrary: fc.tuple(batch, numbers, step, defect).map(([id, some, to, what]): Wish => () => ({
      type: 'send back',
      batch: id,
      connectors: some,
      to,
      defect: what,
    })),
  },
  {
    weight: 1,
    arbitrary: fc
      .tuple(batch, numbers, defect)
      .map(([id, some, what]): Wish => () => ({ type: 'scrap', batch: id, connectors: some, defect: what })),
  },
  {
    weight: 1,
    arbitrary: fc
      .tuple(batch, step, numbers)
      .map(([id, at, some]): Wish => () => ({ type: 'pass', batch: id, step: at, connectors: some })),
  },
  { weight: 1, arbitrary: batch.map((id): Wish => () => ({ type: 'undo', batch: id })) },
  {
    weight: 1,
    arbitrary: fc.tuple(batch, fc.nat({ max: 30 }), fc.boolean()).map(([id, at, all]): Wish => (script) => {
      const entry = script.bench.entries[id]?.[at];
      const targets = entry ? [{ log: entry.log, seq: entry.seq }] : [];
      return { type: 'void', batch: id, targets, reason: 'slip', andWhatRests: all };
    }),
  },
  {
    weight: 1,
    arbitrary: fc.tuple(batch, reason).map(([id, why]): Wish => () => ({ type: 'hold batch', batch: id, reason: why })),
  },
  { weight: 1, arbitrary: batch.map((id): Wish => () => ({ type: 'resume batch', batch: id })) },
  { weight: 1, arbitrary: batch.map((id): Wish => () => ({ type: 'close batch', batch: id })) },
  {
    weight: 1,
    arbitrary: fc
      .tuple(batch, defect)
      .map(([id, what]): Wish => () => ({ type: 'end batch short', batch: id, defect: what })),
  },
  { weight: 1, arbitrary: batch.map((id): Wish => () => ({ type: 'reopen batch', batch: id })) },
);

const play = fc.array(fc.tuple(wish, fc.integer({ min: 0, max: 1500 })), { minLength: 15, maxLength: 60, size: 'max' });

/** Plays wishes on a fresh tablet with two open batches; the third is never opened. */
function played(
  wishes: readonly (readonly [Wish, number])[],
  each?: (script: Script, before: Entry[], granted: boolean) => void,
): Script {
  const script = new Script().open('b1', 3).open('b2', 5);
  wishes.forEach(([make, seconds], index) => {
    const before = [...script.entries];
    const decision = script.wait(seconds).try(make(script, `id-${index}`));
    each?.(script, before, decision.ok);
  });
  return script;
}

const readRecipe = (text: string) => (text === JSON.stringify(smallRecipe) ? smallRecipe : null);
const folded = (entries: readonly Entry[]) => foldBench(inOrder(entries), readRecipe);

/** The steps that are behind a connector since it last began or was sent back. */
function doneSteps(connector: Connector): Set<number> {
  const done = new Set<number>();
  for (const one of connector.history) {
    if (one.kind === 'sent back') for (const later of [...done]) if (later >= one.to) done.delete(later);
    if (one.kind === 'finished' || one.kind === 'unloaded') done.add(one.step);
    if (one.kind === 'judged' && one.verdict === 'pass') done.add(one.step);
  }
  return done;
}

function checkConnectors(found: Batch): void {
  for (const connector of found.connectors) {
    const done = doneSteps(connector);
    const { stands } = connector;
    const behind = stands.at === 'passed' ? found.recipe.steps.length : stands.step;
    for (let index = 0; index < behind; index += 1) expect(done.has(index), `step ${index}`).toBe(true);
    const finished = connector.history.filter(({ kind }) => kind === 'scrapped').length;
    expect(finished).toBe(stands.at === 'scrapped' ? 1 : 0);
    if (stands.at === 'load') {
      const held = found.loads.find(({ id }) => id === stands.load);
      expect(held && !held.ended && held.connectors.includes(connector.number)).toBe(true);
    }
  }
}

describe('laws of the fold', () => {
  it('any order of arrival and any duplication of the same entries gives the same bench', () => {
    const arrival = play.chain((wishes) => {
      const { entries } = played(wishes);
      const duplicated = fc.array(fc.constantFrom(...entries), { maxLength: 10 });
      return duplicated.chain((more) =>
        fc.tuple(
          fc.constant(entries),
          fc.shuffledSubarray([...entries, ...more], { minLength: entries.length + more.length }),
        ),
      );
    });
    fc.assert(
      fc.property(arrival, ([entries, arrived]) => {
        expect(folded(arrived)).toEqual(folded(entries));
      }),
      { numRuns: 60 },
    );
  });

  it('bench-wide: a prefix, then the rest, equals the whole', () => {
    const cut = fc.tuple(play, fc.nat({ max: 200 }));
    fc.assert(
      fc.property(cut, ([wishes, at]) => {
        const wide = played(wishes).entries.filter((entry) => entry.batch === 'bench' && entry.type !== 'voided');
        const first = foldWide(wide.slice(0, at), readRecipe);
        expect(foldWide(wide.slice(at), readRecipe, first)).toEqual(foldWide(wide, readRecipe));
      }),
      { numRuns: 40 },
    );
  });
});

describe('laws of deciding', () => {
  it('no sequence of commands loses a connector, passes one twice or lets one run ahead of an unfinished step', () => {
    let granted = 0;
    fc.assert(
      fc.property(play, (wishes) => {
        const script = played(wishes, (now, before, accepted) => {
          if (accepted) granted += 1;
          else expect(now.entries).toEqual(before);
        });
        const { batches } = script.bench;
        expect(Object.keys(batches).sort()).toEqual(['b1', 'b2'].filter((id) => batches[id]).sort());
        for (const found of Object.values(batches)) {
          expect(found.connectors.map((one) => one.number)).toEqual(found.connectors.map((_, index) => index + 1));
          checkConnectors(found);
          expect(found.misfits).toEqual([]);
        }
      }),
      { numRuns: 250 },
    );
    expect(granted).toBeGreaterThan(1000);
  });
});
