/**
 * @typedef {import('./counts.mjs').Counts & { output?: string }} Outcome
 * @typedef {object} Stage
 * @property {string} name
 * @property {string[]} [after] stages that must have ended before; it runs whatever came of them
 * @property {string[]} [needs] stages that must have passed before; else it counts as one failure
 * @property {() => Promise<Outcome>} run
 */

/**
 * Runs stages, a few at a time, each as soon as it may.
 * @param {Stage[]} stages
 * @param {{ width: number, now: () => number, told: (name: string, outcome: Outcome, seconds: number) => void }} how
 * @returns {Promise<Map<string, Outcome>>}
 */
export async function runStages(stages, { width, now, told }) {
  /** @type {Map<string, Outcome>} */
  const ended = new Map();
  const waiting = [...stages];
  /** @type {Set<Promise<void>>} */
  const running = new Set();

  /** @param {Stage} stage */
  const start = async (stage) => {
    const began = now();
    const lacking = (stage.needs ?? []).find((name) => (ended.get(name)?.failed ?? 0) > 0);
    const outcome =
      lacking === undefined
        ? await stage
            .run()
            .catch((error) => ({ passed: 0, failed: 1, skipped: 0, output: String(error?.message ?? error) }))
        : { passed: 0, failed: 1, skipped: 0, output: `Not run, because ${lacking} failed.` };
    ended.set(stage.name, outcome);
    told(stage.name, outcome, (now() - began) / 1000);
  };

  while (waiting.length > 0 || running.size > 0) {
    const next = waiting.findIndex((each) =>
      [...(each.after ?? []), ...(each.needs ?? [])].every((name) => ended.has(name)),
    );
    if (running.size < width && next >= 0) {
      for (const stage of waiting.splice(next, 1)) {
        const work = start(stage).then(() => void running.delete(work));
        running.add(work);
      }
    } else if (running.size > 0) {
      await Promise.race(running);
    } else {
      throw new Error(`These stages wait for one another: ${waiting.map((each) => each.name).join(', ')}.`);
    }
  }
  return ended;
}
