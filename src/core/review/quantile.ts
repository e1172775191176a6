/**
 * Quantile of values already in ascending order, by R's type 7 (Hyndman and Fan 1996, definition 7: R's default).
 * `probability` is a share from 0 to 1. Null where there are no values.
 */
export function quantileOfSorted(sorted: ArrayLike<number>, probability: number): number | null {
  const last = sorted.length - 1;
  const position = last * Math.min(1, Math.max(0, probability));
  const below = Math.floor(position);
  const lower = sorted[below];
  if (lower === undefined) return null;
  const upper = sorted[below + 1] ?? lower;
  return lower + (position - below) * (upper - lower);
}

/** The same for values in any order; they are left as they are. */
export function quantile(values: ArrayLike<number>, probability: number): number | null {
  return quantileOfSorted(Float64Array.from(values).sort(), probability);
}
