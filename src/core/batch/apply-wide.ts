import { enteredAt, type Entry } from '../event/entry.ts';
import type { Recipe } from '../recipe/schema.ts';
import { shifted, type Moment } from '../unit/moment.ts';
import type { MisfitReason } from './misfit-reasons.ts';
import type { BenchWide, Oven, OvenHappening } from './types.ts';

export const emptyBenchWide: BenchWide = {
  tablet: '',
  operators: [],
  shifts: [],
  onShift: null,
  recipes: {},
  mixes: {},
  ovens: {},
  lastEntryBy: {},
  lastEntry: {},
  seen: {},
  unknownGap: null,
  misfits: [],
};

/** Reads the text of a recipe as it travelled in the log; null where it is not one. */
export type ReadRecipe = (text: string) => Recipe | null;

/** Applies one bench-wide entry; one that does not fit changes nothing else and is kept as a misfit. */
export function applyWide(wide: BenchWide, entry: Entry, readRecipe: ReadRecipe): BenchWide {
  const changed = change(wide, entry, readRecipe);
  if (typeof changed !== 'string') return changed;
  const misfit = { entry: { log: entry.log, seq: entry.seq }, type: entry.type, why: changed };
  return { ...wide, misfits: [...wide.misfits, misfit] };
}

function change(wide: BenchWide, entry: Entry, readRecipe: ReadRecipe): BenchWide | MisfitReason {
  const entered = enteredAt(entry);
  const ago = 'ago' in entry.data ? (entry.data.ago ?? 0) : 0;
  const at = shifted(entered, -ago * 1000);
  switch (entry.type) {
    case 'tabletStarted':
    case 'clockSet':
    case 'tabletWoke':
      return wide;
    case 'timeStated':
      return { ...wide, unknownGap: null };
    case 'benchSet':
      return { ...wide, tablet: entry.data.tablet, operators: entry.data.operators, shifts: entry.data.shifts };
    case 'shiftChanged':
      return { ...wide, onShift: { operator: entry.data.operator, shift: entry.data.shift, since: at } };
    case 'recipeTaken': {
      const recipe = readRecipe(entry.data.text);
      if (!recipe) return 'recipe unknown';
      const taken = { hash: entry.data.hash, recipe };
      return { ...wide, recipes: { ...wide.recipes, [entry.data.hash]: taken } };
    }
    case 'adhesiveMixed': {
      const { mix: id, adhesive, lot, workingLifeS, roomC } = entry.data;
      const mix = { id, adhesive, lot, mixed: at, by: entry.by, workingLifeS, roomC };
      return { ...wide, mixes: { ...wide.mixes, [id]: mix } };
    }
    case 'ovenSet': {
      const { oven, name, setPointC, warmUpS } = entry.data;
      return ovenChanged(wide, oven, name, at, { kind: 'set', setPointC, warmUpS, at, entry });
    }
    case 'ovenRead': {
      const { oven, temperatureC } = entry.data;
      return ovenChanged(wide, oven, null, at, { kind: 'read', temperatureC, at, entry });
    }
    case 'ovenDisturbed':
      return ovenChanged(wide, entry.data.oven, null, at, { kind: entry.data.what, at, entry });
    case 'clockSeen':
      return { ...wide, seen: { ...wide.seen, [entry.data.clock]: { at, lateS: entry.data.lateS } } };
    default:
      return 'unknown entry';
  }
}

function ovenChanged(
  wide: BenchWide,
  id: string,
  name: string | null,
  at: Moment,
  happening: OvenHappening,
): BenchWide {
  const before = wide.ovens[id];
  const oven: Oven = {
    id,
    name: name ?? before?.name ?? id,
    history: insertByTime(before?.history ?? [], { ...happening, entry: bare(happening.entry) }),
  };
  return { ...wide, ovens: { ...wide.ovens, [id]: oven } };
}

const bare = ({ log, seq }: OvenHappening['entry']) => ({ log, seq });

/** A late reading belongs where it happened; within one log bench time decides, across logs entry order stands. */
function insertByTime(history: readonly OvenHappening[], added: OvenHappening): readonly OvenHappening[] {
  let place = history.length;
  while (place > 0) {
    const earlier = history[place - 1];
    if (!earlier || earlier.at.log !== added.at.log || earlier.at.bench <= added.at.bench) break;
    place -= 1;
  }
  return [...history.slice(0, place), added, ...history.slice(place)];
}
