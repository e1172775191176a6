import fc from 'fast-check';
import type { Batch, Bench } from '../../src/core/batch/types.ts';
import type { Command, Late } from '../../src/core/command/commands.ts';
import { benchWide } from '../../src/core/event/entry.ts';
import { smallRecipe } from '../fake/small-recipe.ts';
import { opening } from './bench-kit.ts';

/** What a person might ask of a bench, sensible or not; `fresh` is an id that nothing has yet. */
export type Wish = (bench: Bench, fresh: string) => Command;

const batch = fc.constantFrom('b1', 'b2', 'b3');
const oven = fc.constantFrom('o1', 'o2');
const numbers = fc.uniqueArray(fc.integer({ min: 1, max: 4 }), { minLength: 1, maxLength: 4 });
const defect = fc.constantFrom('scratch', 'crack', 'high-loss');
const late: fc.Arbitrary<Late | undefined> = fc.oneof(
  { weight: 4, arbitrary: fc.constant(undefined) },
  { weight: 1, arbitrary: fc.record({ agoS: fc.integer({ min: 1, max: 1000 }), reason: fc.constant('late') }) },
);
const when = (found: Late | undefined) => (found ? { late: found } : {});

/** Whatever leads the batch on from where its first unfinished connectors stand. */
const onward =
  (id: string, station: string, found: Late | undefined): Wish =>
  (bench, fresh) => {
    const known = bench.batches[id];
    const running = known?.loads.find((one) => !one.ended);
    const after = when(found);
    if (running) return { type: 'end load', batch: id, load: running.id, nextLoad: fresh, reason: 'onward', ...after };
    const { step, numbers: connectors } = standing(known);
    const on = { batch: id, connectors, ...after };
    switch (smallRecipe.steps[step]?.kind) {
      case undefined:
        return { type: 'close batch', batch: id };
      case 'mix':
        return { type: 'mix adhesive', ...on, mix: fresh, lot: 'A', roomC: 23 };
      case 'inspect':
      case 'measure':
        return { type: 'pass', step: stepId(step), ...on };
      case 'do':
        return { type: 'finish step', step: stepId(step), overrunReason: 'onward', ...on };
      default:
        return { type: 'start load', step: stepId(step), load: fresh, station: knownOven(bench, station), ...on };
    }
  };

const stepId = (index: number): string => smallRecipe.steps[index]?.id ?? 'strip';
const knownOven = (bench: Bench, id: string): string => (bench.wide.ovens[id] ? id : '');

function standing(known: Batch | undefined): { step: number; numbers: number[] } {
  const steps = (known?.connectors ?? []).map(({ number, stands }) => ({
    number,
    step: stands.at === 'step' ? stands.step : Infinity,
  }));
  const step = Math.min(...steps.map((one) => one.step));
  return { step, numbers: steps.filter((one) => one.step === step).map(({ number }) => number) };
}

/** One of the latest mixes, for connectors that wait for one or have one that will not last. */
const using =
  (id: string, back: number): Wish =>
  (bench) => {
    const mixes = (bench.entries[benchWide] ?? []).flatMap((entry) =>
      entry.type === 'adhesiveMixed' ? [entry.data.mix] : [],
    );
    const connectors = bench.batches[id]?.connectors.filter(
      ({ mix, stands }) => mix !== null || (stands.at === 'step' && stepId(stands.step) === 'mix'),
    );
    const mix = mixes[mixes.length - 1 - back] ?? 'no such mix';
    return { type: 'use mix', batch: id, connectors: connectors?.map(({ number }) => number) ?? [], mix };
  };

const taking =
  (id: string, at: number, all: boolean): Wish =>
  (bench) => {
    const entries = bench.entries[id] ?? [];
    const entry = entries[entries.length - 1 - at];
    const targets = entry ? [{ log: entry.log, seq: entry.seq }] : [];
    return { type: 'void', batch: id, targets, reason: 'slip', andWhatRests: all };
  };

const onBatch = fc.oneof(
  { weight: 36, arbitrary: fc.tuple(batch, oven, late).map(([id, at, found]) => onward(id, at, found)) },
  {
    weight: 2,
    arbitrary: fc.tuple(batch, numbers, defect).map(([id, connectors, found]): Wish => () => {
      const to = found === 'crack' ? 'strip' : 'film-1';
      return { type: 'send back', batch: id, connectors, to, defect: found };
    }),
  },
  {
    weight: 1,
    arbitrary: fc
      .tuple(batch, numbers, defect)
      .map(([id, connectors, found]): Wish => () => ({ type: 'scrap', batch: id, connectors, defect: found })),
  },
  { weight: 10, arbitrary: fc.tuple(batch, fc.nat({ max: 2 })).map(([...all]) => using(...all)) },
  {
    weight: 1,
    arbitrary: fc.tuple(batch, numbers).map(([id, connectors]): Wish => (_, fresh) => {
      return { type: 'mix adhesive', batch: id, connectors, mix: fresh, lot: 'B', roomC: 23 };
    }),
  },
  { weight: 2, arbitrary: batch.map((id): Wish => () => ({ type: 'undo', batch: id })) },
  { weight: 2, arbitrary: fc.tuple(batch, fc.nat({ max: 8 }), fc.boolean()).map(([...all]) => taking(...all)) },
  { weight: 1, arbitrary: batch.map((id): Wish => () => ({ type: 'hold batch', batch: id, reason: 'lunch' })) },
  { weight: 4, arbitrary: batch.map((id): Wish => () => ({ type: 'resume batch', batch: id })) },
  {
    weight: 4,
    arbitrary: fc
      .tuple(batch, defect)
      .map(([id, found]): Wish => () => ({ type: 'end batch short', batch: id, defect: found })),
  },
  { weight: 8, arbitrary: batch.map((id): Wish => () => ({ type: 'reopen batch', batch: id })) },
  {
    weight: 1,
    arbitrary: batch.map((id): Wish => () => ({ type: 'see clock', batch: id, clock: 'cure:l1', lateS: 12.3 })),
  },
  {
    weight: 3,
    arbitrary: batch.map(
      (id): Wish =>
        () =>
          opening(id, 3),
    ),
  },
);

const onBench = fc.oneof(
  {
    weight: 2,
    arbitrary: fc
      .tuple(oven, fc.constantFrom(100, 110), fc.constantFrom(null, 300))
      .map(([id, setPointC, warmUpS]): Wish => () => ({
        type: 'set oven',
        oven: id,
        name: `Oven ${id} ${setPointC}`,
        setPointC,
        warmUpS,
      })),
  },
  {
    weight: 3,
    arbitrary: fc
      .tuple(oven, fc.integer({ min: 60, max: 120 }), late)
      .map(([id, temperatureC, found]): Wish => () => ({ type: 'read oven', oven: id, temperatureC, ...when(found) })),
  },
  {
    weight: 1,
    arbitrary: fc
      .tuple(oven, fc.constantFrom('door opened', 'power cut'))
      .map(([id, what]): Wish => () => ({ type: 'disturb oven', oven: id, what })),
  },
  { weight: 3, arbitrary: fc.nat({ max: 12 }).map((at) => taking(benchWide, at, false)) },
  {
    weight: 1,
    arbitrary: fc.uniqueArray(fc.constantFrom('MK', 'AB'), { minLength: 1 }).map((operators): Wish => () => ({
      type: 'set bench',
      tablet: `Bench ${operators.length}`,
      operators,
      shifts: [],
    })),
  },
  {
    weight: 1,
    arbitrary: fc
      .constantFrom('MK', 'AB')
      .map((operator): Wish => () => ({ type: 'sign on', operator, shift: 'early' })),
  },
  { weight: 1, arbitrary: fc.nat({ max: 4000 }).map((addedS): Wish => () => ({ type: 'state time', addedS })) },
);

export const wish: fc.Arbitrary<Wish> = fc.oneof({ weight: 5, arbitrary: onBatch }, { weight: 1, arbitrary: onBench });
