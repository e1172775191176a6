/** Decibels of a power ratio e: 4.3429, often printed as 4.34. */
export const dbPerNeper = 10 / Math.LN10;

/** Loss in dB of a joint that lets `share` of the power through, 0 < share <= 1. Infinity where nothing passes. */
export function lossDbOfShare(share: number): number {
  return -10 * Math.log10(share) + 0;
}

/** Loss in dB of a joint that loses `lost` of the power; exact to the last digits for small shares. */
export function lossDbOfLost(lost: number): number {
  return -dbPerNeper * Math.log1p(-lost) + 0;
}

/** Share of the power that passes a loss in dB. */
export function shareOfLossDb(lossDb: number): number {
  return 10 ** (-lossDb / 10);
}

/** Share of the power that a loss in dB takes; exact to the last digits for small losses. */
export function lostOfLossDb(lossDb: number): number {
  return -Math.expm1(-lossDb / dbPerNeper) + 0;
}

/** Losses one after the other add in dB, as their shares multiply. */
export function totalLossDb(lossesDb: readonly number[]): number {
  return lossesDb.reduce((sum, lossDb) => sum + lossDb, 0);
}
