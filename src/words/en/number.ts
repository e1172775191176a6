/** " min", or nothing where a number has no unit. */
const after = (unit: string): string => (unit === '' ? '' : ` ${unit}`);

/** What is wrong with a typed number, as a sentence at its field. */
export const number = {
  empty: (unit: string) => (unit === '' ? 'Enter a number.' : `Enter a number in ${unit}.`),
  notANumber: (typed: string, unit: string) => `“${typed}” is no number${unit === '' ? '' : ` of ${unit}`}.`,
  thousandsSign: (typed: string) => `“${typed}”: write it with one comma or point at most.`,
  tooManyDecimals: (decimals: number) =>
    decimals === 0 ? 'Whole numbers only.' : decimals === 1 ? 'At most 1 decimal.' : `At most ${decimals} decimals.`,
  tooLow: (lowest: number, unit: string) => `At least ${lowest}${after(unit)}.`,
  tooHigh: (highest: number, unit: string) => `At most ${highest}${after(unit)}.`,
};
