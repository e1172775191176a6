/** What the worker has kept, and whether it may clear something away. */
export interface Stockroom {
  keys(): Promise<readonly string[]>;
  remove(key: string): Promise<unknown>;
  /** Fetches and keeps it; rejects when the answer is not a good one. */
  fetch(key: string): Promise<unknown>;
  /** Whether one window at most is open and no other version is being installed or waits. */
  quiet(): Promise<boolean>;
}

/**
 * How many of the wanted keys are not kept, after an attempt to fetch those that can be fetched again. Only a name that
 * carries the hash of its content can: under any other name the server may already hold the next version's file.
 */
export async function countMissing(room: Stockroom, wanted: Iterable<string>): Promise<number> {
  const kept = new Set(await room.keys());
  let missing = 0;
  for (const key of wanted) {
    if (kept.has(key)) continue;
    const restored =
      !key.includes('?') &&
      (await room.fetch(key).then(
        () => true,
        () => false,
      ));
    if (!restored) missing += 1;
  }
  return missing;
}

/**
 * Removes what only other versions used. Not at activation, as is usual: a window of the version before may still be
 * open then and ask for a part that it has not loaded yet. A waiting version shares the room, so nothing is removed
 * while there is one.
 */
export async function clearOlder(room: Stockroom, wanted: Iterable<string>): Promise<void> {
  const keep = new Set(wanted);
  for (const key of await room.keys()) {
    if (keep.has(key)) continue;
    if (!(await room.quiet())) return;
    await room.remove(key);
  }
}
