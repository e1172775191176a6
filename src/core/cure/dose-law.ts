/**
 * How fast a dose grows at a temperature, told by its reciprocal so that a constant temperature held for exactly
 * `fullMs` is exactly a dose of one, without rounding.
 */
export interface DoseLaw {
  /** Milliseconds at this temperature (°C) for a dose of one; Infinity where nothing counts. */
  readonly fullMs: (temperatureC: number) => number;
  /** Temperatures (°C) where `fullMs` jumps or bends: an integral is split there. */
  readonly breaksC: readonly number[];
}

/** A law from a rate in dose per millisecond, as published integrals give it. A rate of 0 counts nothing. */
export function lawFromRate(perMs: (temperatureC: number) => number, breaksC: readonly number[] = []): DoseLaw {
  return { fullMs: (temperatureC) => 1 / perMs(temperatureC), breaksC };
}
