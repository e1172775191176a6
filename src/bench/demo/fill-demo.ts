import { emptyMemory, memoryStore } from '../../log/memory-store.ts';
import { timeOfDay } from '../../words/format.ts';
import { BenchLog, type BenchLogOptions } from '../bench-log.ts';
import { loadShippedRecipes } from '../shipped-recipes.ts';
import { demoShiftPlan, shiftSoFarMs } from './demo-shift.ts';

const fiveMinutesMs = 5 * 60_000;
const shiftMs = 8 * 3_600_000;

/**
 * Fills an empty store with an invented shift that ends now: a log like any other, played on counted time and written
 * with one append. Throws where a command of the shift is refused.
 */
export async function fillDemo(options: BenchLogOptions): Promise<void> {
  const { store, clock, randomId } = options;
  const now = clock.stamp();
  const beganMs = Math.floor(now.wall) - shiftSoFarMs;
  let atMs = beganMs;
  const page = randomId();
  const counted = { stamp: () => ({ ...now, wall: atMs, mono: atMs - beganMs, page }) };
  const played = memoryStore(emptyMemory());
  const log = await BenchLog.start({ ...options, store: played, clock: counted });
  const from = Math.floor(beganMs / fiveMinutesMs) * fiveMinutesMs;
  const hours = { from: timeOfDay(from, now.offset), to: timeOfDay(from + shiftMs, now.offset) };
  for (const planned of demoShiftPlan({ recipes: await loadShippedRecipes(), randomId, hours })) {
    // Two commands of one instant would be taken for one.
    atMs = Math.max(atMs + 1, now.wall + planned.atMs);
    const answer = await log.ask(planned.command);
    if (!answer.ok) throw new Error(`demo: ${planned.command.type}: ${JSON.stringify(answer.error)}`);
  }
  const [lines, rows, { head }] = [await played.lines(), await played.derived(''), log];
  if (head) await store.append(null, lines, head, rows);
}
