/** Finer than any instrument of this trade reads, far coarser than the rounding of a double. */
const stepsPerUnit = 1e6;

/**
 * A reading as the decimal that it was: differences and products of decimals are cleared of binary rounding at the
 * sixth digit, so that a value on a limit is on it.
 */
export function decimal(value: number): number {
  return Math.round(value * stepsPerUnit) / stepsPerUnit + 0;
}

/** To the sixth decimal; a value on the limit is at most the limit. False where either is NaN. */
export const isAtMost = (value: number, limit: number): boolean => decimal(value) <= decimal(limit);
export const isAtLeast = (value: number, limit: number): boolean => decimal(value) >= decimal(limit);
