/** The quantile of R type 7: linear between the two nearest. @param {readonly number[]} values @param {number} share */
export function quantile(values, share) {
  const sorted = [...values].sort((a, b) => a - b);
  const place = (sorted.length - 1) * share;
  const low = sorted[Math.floor(place)] ?? NaN;
  const high = sorted[Math.ceil(place)] ?? NaN;
  return low + (high - low) * (place - Math.floor(place));
}

/** @param {readonly number[]} values */
export const median = (values) => quantile(values, 0.5);

/**
 * Runs subject and floor by turns and tells each one's figures. Which of the two goes first changes every round, so that
 * neither always pays for what the other left behind.
 * @param {{ rounds: number, subject: () => Promise<number> | number, floor: () => Promise<number> | number }} what
 *   each answers with what it took
 */
export async function byTurns({ rounds, subject, floor }) {
  /** @type {{ subject: number, floor: number }[]} */
  const pairs = [];
  for (let round = 0; round < rounds; round += 1) {
    const subjectFirst = round % 2 === 0;
    const first = await (subjectFirst ? subject() : floor());
    const second = await (subjectFirst ? floor() : subject());
    pairs.push(subjectFirst ? { subject: first, floor: second } : { subject: second, floor: first });
  }
  return pairs;
}

/** The median of each, and the median of the ratios. @param {readonly { subject: number, floor: number }[]} pairs */
export function ratioOf(pairs) {
  return {
    value: median(pairs.map(({ subject }) => subject)),
    floor: median(pairs.map(({ floor }) => floor)),
    ratio: median(pairs.map(({ subject, floor }) => subject / floor)),
  };
}

/** Lowest and highest ratio, for a note. @param {readonly { subject: number, floor: number }[]} pairs */
export function spread(pairs) {
  const ratios = pairs.map(({ subject, floor }) => subject / floor);
  return `${pairs.length} rounds, ${Math.min(...ratios).toFixed(2)} to ${Math.max(...ratios).toFixed(2)}`;
}
