import * as fc from 'fast-check';
import type { Batch } from '../../../src/core/batch/types.ts';
import { DayBook, type WrittenAt } from './day-book.ts';
import { hashOf, takenRecipes } from './tiny-recipe.ts';

const recipeIds = ['tiny', 'other'] as const;
const recipes = takenRecipes(recipeIds);
const defects = ['scratch', 'crack', 'void'] as const;
const v = 1 as const;
/** Two tablets whose clocks differ can make an entry that comes too early; it changes nothing. */
const skewed = 'earlier than what it follows';

/** Where random batches begin, in ms since 1970. */
export const earliestMs = Date.UTC(2026, 2, 2, 6);

/** One turn of the dice: which connectors and what is done with them is read against the state at that moment. */
interface Move {
  readonly action: number;
  readonly connectors: number;
  readonly defect: (typeof defects)[number];
  readonly passesMs: number;
  readonly gapS: number;
  readonly lateS: number;
  readonly otherTablet: boolean;
  readonly wallSetByMs: number;
}

const move: fc.Arbitrary<Move> = fc.record({
  action: fc.nat(99),
  // Mostly all that stand together, so that batches come to an end.
  connectors: fc.oneof(fc.constant(63), fc.nat(63)),
  defect: fc.constantFrom(...defects),
  passesMs: fc.nat(40 * 60_000),
  gapS: fc.nat(5000).map((tenths) => tenths / 10),
  lateS: fc.integer({ min: -600, max: 600 }),
  otherTablet: fc.nat(19).map((dice) => dice === 0),
  wallSetByMs: fc.nat(19).chain((dice) => (dice === 0 ? fc.integer({ min: -7e6, max: 7e6 }) : fc.constant(0))),
});

interface Plan {
  readonly recipe: (typeof recipeIds)[number];
  readonly size: number;
  readonly opensAfterMs: number;
  readonly moves: readonly Move[];
  readonly ending: 'open' | 'complete' | 'short';
}

const plan: fc.Arbitrary<Plan> = fc.record({
  recipe: fc.constantFrom(...recipeIds),
  size: fc.integer({ min: 1, max: 6 }),
  opensAfterMs: fc.nat(12 * 3_600_000),
  moves: fc.array(move, { minLength: 5, maxLength: 32 }),
  ending: fc.constantFrom('open', 'complete', 'short'),
});

/** Batches that were folded from entries which all fit; some open, some closed, some by two tablets. */
export const randomBatches: fc.Arbitrary<readonly Batch[]> = fc
  .array(plan, { minLength: 1, maxLength: 4 })
  .map((plans) => plans.map((one, index) => played(one, `batch-${index + 1}`, (index % 12) + 1)));

function played({ recipe, size, opensAfterMs, moves, ending }: Plan, id: string, tag: number): Batch {
  const book = new DayBook(id, recipes);
  const clock = { benchMs: earliestMs + opensAfterMs, wallMs: earliestMs + opensAfterMs };
  const data = { tag, workOrder: 'WO 1', recipe: hashOf(recipe), connectors: Array.from({ length: size }, () => ({})) };
  book.write(clock, { type: 'batchOpened', v, data });
  for (const next of moves) {
    clock.benchMs += next.passesMs;
    clock.wallMs += next.passesMs + next.wallSetByMs;
    // The other tablet's bench time has its own zero.
    const at = next.otherTablet ? { ...clock, log: 'log-b', benchMs: clock.benchMs - earliestMs } : { ...clock };
    play(book, next, at);
  }
  const done = book.batch(skewed).connectors.every(({ stands }) => stands.at === 'passed' || stands.at === 'scrapped');
  if (ending === 'short') book.write(clock, { type: 'batchClosed', v, data: { how: 'short', defect: 'crack' } });
  if (ending === 'complete' && done) book.write(clock, { type: 'batchClosed', v, data: { how: 'complete' } });
  return book.batch(skewed);
}

function play(book: DayBook, { action, connectors: mask, defect, gapS, lateS }: Move, at: WrittenAt): void {
  const batch = book.batch(skewed);
  const working = batch.connectors.filter(({ stands }) => stands.at === 'step' || stands.at === 'load');
  const leader = working[mask % Math.max(1, working.length)];
  if (!leader || leader.stands.at === 'passed' || leader.stands.at === 'scrapped') return;
  const { step: index } = leader.stands;
  const mates = working.filter(({ stands }) => JSON.stringify(stands) === JSON.stringify(leader.stands));
  const some = mates.filter((mate) => mate === leader || ((mask >> (mate.number - 1)) & 1) === 1);
  const connectors = some.map(({ number }) => number);
  const step = batch.recipe.steps[index];
  if (!step) return;
  if (action < 3) return book.write(at, { type: 'scrapped', v, data: { connectors, defect, gap: gapS } });
  if (action < 12 && index > 0) {
    const to = batch.recipe.steps[action % index]?.id ?? '';
    const attempt = action < 6 ? 'new' : 'same';
    return book.write(at, { type: 'sentBack', v, data: { connectors, to, defect, attempt, gap: gapS } });
  }
  if (leader.stands.at === 'load') {
    const { load } = leader.stands;
    const verdict = lateS < 0 ? 'early' : lateS > 300 ? 'over' : 'in time';
    return book.write(at, { type: 'loadEnded', v, data: { load, verdict, lateS, reason: 'dice', gap: gapS } });
  }
  switch (step.kind) {
    case 'mix': {
      const mix = `mix-${book.entries.length}`;
      return book.write(at, { type: 'stepFinished', v, data: { step: step.id, connectors, mix, gap: gapS } });
    }
    case 'inspect':
      return book.write(at, { type: 'judged', v, data: { step: step.id, connectors, verdict: 'pass', gap: gapS } });
    case 'do': {
      const overrun = lateS > 400 ? { overrun: { lateS, reason: 'dice' } } : {};
      return book.write(at, { type: 'stepFinished', v, data: { step: step.id, connectors, gap: gapS, ...overrun } });
    }
    default: {
      const load = `${batch.id}-load-${book.entries.length}`;
      const data = { load, step: step.id, connectors, station: 'station-1', gap: gapS };
      return book.write(at, { type: 'loadStarted', v, data });
    }
  }
}
