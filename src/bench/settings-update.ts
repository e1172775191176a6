import type { Reading } from '../core/timer/reading.ts';
import type { AppUpdate } from '../device/app-update.ts';
import type { BenchLog } from './bench-log.ts';
import type { Saving } from './bench-state.svelte.ts';

/** No new version is taken this near to a moment when somebody is needed, in ms. */
export const quietMs = 2 * 60_000;

export type UpdateHindrance = 'clock due' | 'polish' | 'not saved';

/** Why a new version is not taken now; null where it may be. What is due and waits counts as due. */
export function updateHindrance(readings: readonly Reading[], saving: Saving['state']): UpdateHindrance | null {
  if (saving !== 'saved') return 'not saved';
  if (readings.some(({ clock }) => clock.about.type === 'polish')) return 'polish';
  const due = readings.some(({ leftMs, leftToOverMs }) => Math.min(leftMs, leftToOverMs) <= quietMs);
  return due ? 'clock due' : null;
}

/** Takes the waiting version once all that was asked for is written. */
export async function takeUpdate(log: BenchLog, update: AppUpdate): Promise<void> {
  // Writes come one after the other: nothing written is answered when all before it is.
  await log.write([]);
  update.accept();
}
