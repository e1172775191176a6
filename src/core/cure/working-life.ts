import { speedRatio } from './arrhenius.ts';

/** What an adhesive says of its working life after mixing. */
export interface WorkingLife {
  readonly workingLifeMinutes: number;
  /** Room temperature (°C) at which the maker gives that life. */
  readonly workingLifeAtC: number;
  /** Activation energy in kJ/mol; null: the life is taken as fixed. */
  readonly workingLifeActivationKJPerMol: number | null;
}

/**
 * Working life in whole seconds, rounded down, of a mix made in a room of this temperature (°C; null: not measured,
 * the reference life). With an activation energy a warmer room shortens it by Arrhenius. A colder room lengthens
 * nothing: a large mix warms itself, and no maker vouches for more than the stated life. Outside 10 to 40 °C the rule
 * needs no exception: the cold side is already capped, and on the hot side the line carried on gives the shorter,
 * careful answer.
 */
export function workingLifeSeconds(adhesive: WorkingLife, roomC: number | null): number {
  const { workingLifeMinutes, workingLifeAtC, workingLifeActivationKJPerMol } = adhesive;
  const statedS = workingLifeMinutes * 60;
  if (workingLifeActivationKJPerMol === null || roomC === null || roomC <= workingLifeAtC) return Math.floor(statedS);
  return Math.floor(statedS / speedRatio(workingLifeActivationKJPerMol, roomC, workingLifeAtC));
}
