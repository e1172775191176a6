/** Molar gas constant in J/(mol K), rounded as in the tables that the reference tests use. */
export const gasConstantJPerMolK = 8.314463;

/** 0 °C in kelvin. */
export const zeroCelsiusK = 273.15;

/** 1/T in 1/K of a temperature in °C. */
export function perKelvin(temperatureC: number): number {
  return 1 / (temperatureC + zeroCelsiusK);
}

/**
 * How many times faster a reaction with this activation energy (kJ/mol) runs at one temperature (°C) than at a
 * reference temperature (°C); exactly 1 at the reference.
 */
export function speedRatio(activationKJPerMol: number, temperatureC: number, referenceC: number): number {
  const activationK = (activationKJPerMol * 1000) / gasConstantJPerMolK;
  return Math.exp(activationK * (perKelvin(referenceC) - perKelvin(temperatureC)));
}
