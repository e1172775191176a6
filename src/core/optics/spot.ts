/**
 * Spot radius here is the 1/e radius of the field (1/e² of the intensity), which is half of the mode-field diameter.
 * Some texts use the spot radius divided by √2; the two must not be mixed.
 */
export const spotRadiusOfModeField = (modeFieldDiameterUm: number): number => modeFieldDiameterUm / 2;
export const modeFieldOfSpotRadius = (spotRadiusUm: number): number => 2 * spotRadiusUm;

/** V of a step-index fibre. */
export function normalisedFrequency(coreRadiusUm: number, numericalAperture: number, wavelengthNm: number): number {
  return (2 * Math.PI * coreRadiusUm * numericalAperture) / (wavelengthNm / 1000);
}

/**
 * Spot radius in µm of a step-index single-mode fibre, by Marcuse's fit to the Gaussian that couples best
 * (D. Marcuse, Bell Syst. Tech. J., 1977): good to about 1 % for V between 1.2 and 2.4 (from memory).
 */
export function spotRadiusUm(coreRadiusUm: number, normalisedFrequency: number): number {
  const v = normalisedFrequency;
  return coreRadiusUm * (0.65 + 1.619 * v ** -1.5 + 2.879 * v ** -6);
}
