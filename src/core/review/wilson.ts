/** Two-sided standard normal quantiles, from R's qnorm(0.975) and qnorm(0.95). */
const normalQuantile = { '95 %': 1.959963984540054, '90 %': 1.6448536269514722 } as const;

export interface Interval {
  readonly low: number;
  readonly high: number;
}

/**
 * Wilson score interval, without continuity correction, of a share of `count` in `of` (0 <= count <= of).
 * Source: NIST/SEMATECH e-Handbook, 7.2.4.1. Null where `of` is 0: nothing is known of a share of nothing.
 */
export function wilsonInterval(count: number, of: number, confidence: '95 %' | '90 %' = '95 %'): Interval | null {
  if (of === 0) return null;
  const z = normalQuantile[confidence];
  const centre = count + (z * z) / 2;
  const halfWidth = z * Math.sqrt((count * (of - count)) / of + (z * z) / 4);
  // At the ends the exact bound is 0 or 1; rounding must not push it past.
  return {
    low: count === 0 ? 0 : (centre - halfWidth) / (of + z * z),
    high: count === of ? 1 : (centre + halfWidth) / (of + z * z),
  };
}
