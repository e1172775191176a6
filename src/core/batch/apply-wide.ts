import { enteredAt, type Entry, type EntryId } from '../event/entry.ts';
import type { Recipe } from '../recipe/schema.ts';
import { shifted } from '../unit/moment.ts';
import type { MisfitReason } from './misfit-reasons.ts';
import type { BenchWide, OvenHappening } from './types.ts';

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

type Register = 'recipes' | 'mixes' | 'ovens' | 'seen';
type Growing<Key extends Register> = Record<string, BenchWide[Key][string]>;

/**
 * Bench-wide state while it is being folded. A register is copied at its first change and then grows in place: one
 * that did not change stays the same object, by which others tell.
 */
export type OpenWide = { -readonly [Key in keyof BenchWide]: BenchWide[Key] } & {
  readonly copied: Set<Register>;
  /** Histories of ovens that are copies already. */
  readonly histories: Map<string, OvenHappening[]>;
};

export function openWide(wide: BenchWide): OpenWide {
  return { ...wide, copied: new Set(), histories: new Map() };
}

function growing<Key extends Register>(wide: OpenWide, key: Key): Growing<Key> {
  if (!wide.copied.has(key)) {
    wide[key] = { ...wide[key] };
    wide.copied.add(key);
  }
  return wide[key] as Growing<Key>;
}

/** Applies one bench-wide entry; one that does not fit changes nothing else and is kept as a misfit. */
export function applyToWide(wide: OpenWide, entry: Entry, readRecipe: ReadRecipe): void {
  const misfit = change(wide, entry, readRecipe);
  if (misfit) wide.misfits = [...wide.misfits, { entry: bare(entry), type: entry.type, why: misfit }];
}

function change(wide: OpenWide, entry: Entry, readRecipe: ReadRecipe): MisfitReason | null {
  const ago = 'ago' in entry.data ? (entry.data.ago ?? 0) : 0;
  const at = shifted(enteredAt(entry), -ago * 1000);
  switch (entry.type) {
    case 'tabletStarted':
    case 'clockSet':
    case 'tabletWoke':
      return null;
    case 'timeStated':
      wide.unknownGap = null;
      return null;
    case 'benchSet':
      wide.tablet = entry.data.tablet;
      wide.operators = entry.data.operators;
      wide.shifts = entry.data.shifts;
      return null;
    case 'shiftChanged':
      wide.onShift = { operator: entry.data.operator, shift: entry.data.shift, since: at };
      return null;
    case 'recipeTaken': {
      const recipe = readRecipe(entry.data.text);
      if (!recipe) return 'recipe unknown';
      growing(wide, 'recipes')[entry.data.hash] = { hash: entry.data.hash, recipe };
      return null;
    }
    case 'adhesiveMixed': {
      const { mix: id, adhesive, lot, workingLifeS, roomC } = entry.data;
      growing(wide, 'mixes')[id] = { id, adhesive, lot, mixed: at, by: entry.by, workingLifeS, roomC };
      return null;
    }
    case 'ovenSet': {
      const { oven, name, setPointC, warmUpS } = entry.data;
      return ovenChanged(wide, oven, name, { kind: 'set', setPointC, warmUpS, at, entry: bare(entry) });
    }
    case 'ovenRead': {
      const { oven, temperatureC } = entry.data;
      return ovenChanged(wide, oven, null, { kind: 'read', temperatureC, at, entry: bare(entry) });
    }
    case 'ovenDisturbed':
      return ovenChanged(wide, entry.data.oven, null, { kind: entry.data.what, at, entry: bare(entry) });
    case 'clockSeen':
      growing(wide, 'seen')[entry.data.clock] = { at, lateS: entry.data.lateS };
      return null;
    default:
      return 'unknown entry';
  }
}

const bare = ({ log, seq }: EntryId): EntryId => ({ log, seq });

function ovenChanged(wide: OpenWide, id: string, name: string | null, happening: OvenHappening): null {
  const before = wide.ovens[id];
  let history = wide.histories.get(id);
  if (!history) {
    history = [...(before?.history ?? [])];
    wide.histories.set(id, history);
  }
  insertByTime(history, happening);
  growing(wide, 'ovens')[id] = { id, name: name ?? before?.name ?? id, history };
  return null;
}

/** A late reading belongs where it happened; within one log bench time decides, across logs entry order stands. */
function insertByTime(history: OvenHappening[], added: OvenHappening): void {
  let place = history.length;
  while (place > 0) {
    const earlier = history[place - 1];
    if (!earlier || earlier.at.log !== added.at.log || earlier.at.bench <= added.at.bench) break;
    place -= 1;
  }
  if (place === history.length) history.push(added);
  else history.splice(place, 0, added);
}
