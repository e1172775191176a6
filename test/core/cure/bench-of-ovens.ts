import type { CureInput } from '../../../src/core/cure/cure.ts';
import type { CureLaw } from '../../../src/core/cure/cure-time.ts';
import type { OvenEntry } from '../../../src/core/cure/oven-entry.ts';
import type { Moment } from '../../../src/core/unit/moment.ts';

/** Ten o'clock of a counted day: every moment below is told in minutes after it. */
const tenMs = 1_000_000_000_000;

export const minutes = (count: number): number => count * 60_000;

export const at = (afterTenMinutes: number, log = 'tablet-a'): Moment => ({
  log,
  bench: tenMs + minutes(afterTenMinutes),
  wall: tenMs + minutes(afterTenMinutes),
});

export const set = (afterTen: number, setPointC: number, warmUpS: number | null = null): OvenEntry => ({
  kind: 'set',
  at: at(afterTen),
  setPointC,
  warmUpS,
});
export const read = (afterTen: number, temperatureC: number): OvenEntry => ({
  kind: 'read',
  at: at(afterTen),
  temperatureC,
});
export const door = (afterTen: number): OvenEntry => ({ kind: 'door opened', at: at(afterTen) });
export const powerCut = (afterTen: number): OvenEntry => ({ kind: 'power cut', at: at(afterTen) });

/** An invented adhesive with round numbers. */
export const adhesive: CureLaw & { longestDose: number } = {
  curePairs: [
    { temperatureC: 80, minutes: 60 },
    { temperatureC: 100, minutes: 20 },
    { temperatureC: 120, minutes: 8 },
  ],
  lowestC: 80,
  highestC: 130,
  longestDose: 3,
};

/** A load that went in at ten, recipe set point 100 °C. */
export const loadAtTen = (...oven: OvenEntry[]): CureInput => ({ from: at(0), setPointC: 100, adhesive, oven });
