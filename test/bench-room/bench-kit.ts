import { BenchLog, type Answer } from '../../src/bench/bench-log.ts';
import { foldBench } from '../../src/core/batch/fold.ts';
import type { Batch, Bench } from '../../src/core/batch/types.ts';
import type { Command } from '../../src/core/command/commands.ts';
import { benchWide, type Entry, type Line } from '../../src/core/event/entry.ts';
import { sha256 } from '../../src/core/event/hash.ts';
import { parseLine } from '../../src/core/event/line.ts';
import { inOrder } from '../../src/core/event/order.ts';
import type { Recipe } from '../../src/core/recipe/schema.ts';
import { emptyMemory, memoryStore, type Memory } from '../../src/log/memory-store.ts';
import type { LogStore } from '../../src/log/store.ts';
import { fakeClock, type FakeClock } from '../fake/clock.ts';
import { smallRecipe } from '../fake/small-recipe.ts';

export const smallText = JSON.stringify(smallRecipe);
export const readSmall = (text: string): Recipe | null => (text === smallText ? smallRecipe : null);

/** Ids that are the same in every run, and in no two calls. */
export function countedIds(prefix = 'id'): () => string {
  let count = 0;
  return () => `${prefix}-${(count += 1)}`;
}

export interface Place {
  readonly memory: Memory;
  readonly clock: FakeClock;
  readonly randomId: () => string;
}

export const newPlace = (wallMs?: number): Place => ({
  memory: emptyMemory(),
  clock: fakeClock(wallMs),
  randomId: countedIds(),
});

export function startOn(
  place: Place,
  store: LogStore = memoryStore(place.memory),
  clock: FakeClock = place.clock,
): Promise<BenchLog> {
  return BenchLog.start({
    store,
    clock: { stamp: () => ({ ...clock.reading(), offset: 0, zone: 'UTC' }) },
    readRecipe: readSmall,
    randomId: place.randomId,
    app: 'test',
  });
}

/** The page is loaded anew on the same storage. */
export function restart(place: Place, store?: LogStore): Promise<BenchLog> {
  place.clock.reload();
  return startOn(place, store);
}

/** Asks for what must be granted. A millisecond passes, so that commands can be told apart. */
export async function granted(log: BenchLog, place: Place, ...commands: Command[]): Promise<readonly Entry[]> {
  const all: Entry[] = [];
  for (const command of commands) {
    await place.clock.pass(1);
    const answer = await log.ask(command);
    if (!answer.ok) throw new Error(`${command.type}: ${JSON.stringify(answer.error)}`);
    all.push(...answer.value);
  }
  return all;
}

export const codeOf = (answer: Answer): string | null => (answer.ok ? null : answer.error.code);

/** The small recipe in use, and a batch opened with it. */
export async function openBatch(log: BenchLog, place: Place, batch: string, connectors: number): Promise<void> {
  const hash = sha256(smallText);
  if (!log.bench.wide.recipes[hash]) {
    await log.write([{ batch: benchWide, type: 'recipeTaken', v: 1, data: { hash, text: smallText } }]);
  }
  await granted(log, place, opening(batch, connectors));
}

export const opening = (batch: string, connectors: number): Command => ({
  type: 'open batch',
  batch,
  tag: null,
  workOrder: `WO ${batch}`,
  recipeText: smallText,
  connectors: Array.from({ length: connectors }, () => ({})),
});

export const linesIn = ({ memory }: Pick<Place, 'memory'>): Line[] => [...memory.lines.values()] as Line[];

export function entriesIn(place: Pick<Place, 'memory'>): Entry[] {
  return inOrder(
    linesIn(place).flatMap(({ text }) => {
      const read = parseLine(text);
      return read.ok ? [read.value] : [];
    }),
  );
}

/** What the bench must be: every line folded, with nothing left out. */
export const wholeBench = (place: Pick<Place, 'memory'>): Bench => foldBench(entriesIn(place), readSmall);

export const openIn = (bench: Bench): Record<string, Batch> =>
  Object.fromEntries(Object.entries(bench.batches).filter(([, batch]) => !batch.closed));

export const keysIn = ({ memory }: Pick<Place, 'memory'>, prefix: string): string[] =>
  [...memory.derived.keys()].filter((key) => key.startsWith(prefix)).sort();
