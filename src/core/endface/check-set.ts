import { checkCount, checkNumber, type NumberRefusal } from '../unit/number-check.ts';
import type { CriterionSet, CriterionZone, SizeBands } from './criterion.ts';

/** What is wrong with a set, and in which zone; null where it concerns the whole. */
export type SetProblem = { readonly zone: string | null } & (
  | { readonly code: 'text unfit'; readonly field: 'id' | 'name' | 'edition' | 'letter' }
  | { readonly code: 'no zones' }
  | { readonly code: 'letter twice' }
  | { readonly code: 'zones do not join'; readonly expectedUm: number; readonly foundUm: number }
  | { readonly code: 'zone without width' }
  | { readonly code: 'bands do not rise'; readonly kind: 'scratch' | 'defect' }
  | { readonly code: 'bands do not end open'; readonly kind: 'scratch' | 'defect' }
  | { readonly code: 'larger allowed more often'; readonly kind: 'scratch' | 'defect' }
  | { readonly code: 'number unfit'; readonly refusal: NumberRefusal<SetField> }
);

type SetField = 'innerDiameterUm' | 'outerDiameterUm' | 'um' | 'most' | 'cleanings';

const diameterRangeUm = { lowest: 0, highest: 2500 };
const edgeRangeUm = { lowest: 0.01, highest: 1000 };
const countRange = { lowest: 0, highest: 1000 };
const cleaningRange = { lowest: 0, highest: 20 };
const mostZones = 8;
const mostBands = 8;

/** All that keeps a set from judging; empty where it may. */
export function setProblems(set: CriterionSet): SetProblem[] {
  const problems: SetProblem[] = [];
  if (!/^[a-z0-9]+(-[a-z0-9]+)*$/.test(set.id)) problems.push({ zone: null, code: 'text unfit', field: 'id' });
  for (const field of ['name', 'edition'] as const) {
    if (!isText(set[field], 120)) problems.push({ zone: null, code: 'text unfit', field });
  }
  const refusal = checkCount('cleanings', set.cleanings.most, cleaningRange);
  if (refusal) problems.push({ zone: null, code: 'number unfit', refusal });
  if (set.zones.length === 0 || set.zones.length > mostZones) problems.push({ zone: null, code: 'no zones' });
  return [...problems, ...set.zones.flatMap((zone, index) => zoneProblems(set.zones, zone, index))];
}

const isText = (text: string, longest: number): boolean => text.trim() !== '' && text.length <= longest;

function zoneProblems(zones: readonly CriterionZone[], zone: CriterionZone, index: number): SetProblem[] {
  const { letter, innerDiameterUm, outerDiameterUm } = zone;
  const refusal =
    checkNumber('innerDiameterUm', innerDiameterUm, diameterRangeUm) ??
    checkNumber('outerDiameterUm', outerDiameterUm, diameterRangeUm);
  const expectedUm = zones[index - 1]?.outerDiameterUm ?? 0;
  const problems: SetProblem[] = [];
  if (!isText(letter, 8)) problems.push({ zone: letter, code: 'text unfit', field: 'letter' });
  if (zones.findIndex((other) => other.letter === letter) < index)
    problems.push({ zone: letter, code: 'letter twice' });
  if (refusal) problems.push({ zone: letter, code: 'number unfit', refusal });
  else if (innerDiameterUm !== expectedUm) {
    problems.push({ zone: letter, code: 'zones do not join', expectedUm, foundUm: innerDiameterUm });
  } else if (outerDiameterUm <= innerDiameterUm) problems.push({ zone: letter, code: 'zone without width' });
  return [
    ...problems,
    ...bandProblems(letter, 'scratch', zone.scratches),
    ...bandProblems(letter, 'defect', zone.defects),
  ];
}

function bandProblems(zone: string, kind: 'scratch' | 'defect', bands: SizeBands): SetProblem[] {
  const numbers = bands.flatMap(({ until, most }): SetProblem[] => {
    const refusal =
      (until && checkNumber('um', until.um, edgeRangeUm)) ??
      (most === null ? null : checkCount('most', most, countRange));
    return refusal ? [{ zone, code: 'number unfit', refusal }] : [];
  });
  const problems: SetProblem[] = [];
  const last = bands.at(-1);
  if (last === undefined || last.until !== null || bands.length > mostBands) {
    problems.push({ zone, code: 'bands do not end open', kind });
  }
  const pairs = bands.slice(1).map((band, index) => ({ smaller: bands[index] ?? band, larger: band }));
  if (!pairs.every(({ smaller, larger }) => isBelow(smaller.until, larger.until))) {
    problems.push({ zone, code: 'bands do not rise', kind });
  }
  if (!pairs.every(({ smaller, larger }) => (smaller.most ?? Infinity) >= (larger.most ?? Infinity))) {
    problems.push({ zone, code: 'larger allowed more often', kind });
  }
  return [...numbers, ...problems];
}

type Edge = SizeBands[number]['until'];

function isBelow(edge: Edge, next: Edge): boolean {
  if (edge === null) return false;
  if (next === null || edge.um < next.um) return true;
  return edge.um === next.um && !edge.including && next.including;
}
