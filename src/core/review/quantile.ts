/**
 * Quantile by R's type 7 (Hyndman and Fan 1996, definition 7: R's default). `probability` is a share from 0 to 1.
 * Null where there are no values. The values are left as they are.
 */
export function quantile(values: ArrayLike<number>, probability: number): number | null {
  return quantileInPlace(Float64Array.from(values), probability);
}

/** The same without a copy: the values come out in another order. By selection, since sorting a year takes longer. */
export function quantileInPlace(values: Float64Array, probability: number): number | null {
  const last = values.length - 1;
  if (last < 0) return null;
  const position = last * Math.min(1, Math.max(0, probability));
  const below = Math.floor(position);
  const lower = select(values, below);
  if (position === below) return lower;
  let upper = Infinity;
  for (let index = below + 1; index <= last; index += 1) upper = Math.min(upper, values[index] ?? Infinity);
  return lower + (position - below) * (upper - lower);
}

/** Hoare's selection: puts the value of this rank (from 0) in its place, lesser ones before and greater ones after. */
function select(values: Float64Array, rank: number): number {
  let low = 0;
  let high = values.length - 1;
  while (low < high) {
    const pivot = values[(low + high) >> 1] ?? NaN;
    let left = low;
    let right = high;
    while (left <= right) {
      while ((values[left] ?? Infinity) < pivot) left += 1;
      while ((values[right] ?? -Infinity) > pivot) right -= 1;
      if (left > right) break;
      const moved = values[left] ?? NaN;
      values[left] = values[right] ?? NaN;
      values[right] = moved;
      left += 1;
      right -= 1;
    }
    if (rank <= right) high = right;
    else if (rank >= left) low = left;
    else break;
  }
  return values[rank] ?? NaN;
}
