import { removeDatabase } from '../log/database.ts';
import type { BenchLog } from './bench-log.ts';
import { readMode, writeMode } from './mode.ts';

/** Deletes the demo bench with all that is in it and loads the page on the real one. False where it could not be. */
export async function removeDemo(log: BenchLog): Promise<boolean> {
  const mode = readMode(localStorage);
  if (mode.kind !== 'demo') return false;
  await log.write([]);
  log.close();
  try {
    await removeDatabase(mode.database);
  } catch {
    return false;
  }
  writeMode(localStorage, 'real');
  window.location.reload();
  return true;
}
