import type { Basis } from '../unit/basis.ts';
import type { CriterionSet, CriterionZone, SizeBands, ZonePart } from './criterion.ts';

/**
 * The sets that come with the app. Tables of IEC 61300-3-35 edition 2 rest on memory and on nothing that was read;
 * edition 3 has other zones and counts, and is not here because they are not known.
 */

const anything: SizeBands = [{ until: null, most: null }];
const nothing: SizeBands = [{ until: null, most: 0 }];
/** At most so many up to and including a width, none wider. */
const upTo = (um: number, most: number | null): SizeBands => [
  { until: { um, including: true }, most },
  { until: null, most: 0 },
];
/** No limit below 2 µm, five from 2 to 5 µm, none larger. */
const claddingDefects: SizeBands = [
  { until: { um: 2, including: false }, most: null },
  { until: { um: 5, including: true }, most: 5 },
  { until: null, most: 0 },
];
const contactDefects: SizeBands = [
  { until: { um: 10, including: false }, most: null },
  { until: null, most: 0 },
];

function zone(
  letter: string,
  part: ZonePart,
  [innerDiameterUm, outerDiameterUm]: readonly [number, number],
  scratches: SizeBands,
  defects: SizeBands,
): CriterionZone {
  return { letter, part, innerDiameterUm, outerDiameterUm, scratches, defects };
}

const adhesiveAndContact: readonly CriterionZone[] = [
  zone('C', 'adhesive', [115, 135], anything, anything),
  zone('D', 'contact', [135, 250], anything, contactDefects),
];

const cleanings: CriterionSet['cleanings'] = {
  most: 3,
  basis: { rests: 'common practice, no source', confirmed: null },
};
const edition2 = (table: number): { readonly edition: string; readonly basis: Basis } => ({
  edition: 'edition 2 (2015)',
  basis: { rests: 'from memory', source: `IEC 61300-3-35 edition 2, table ${table}`, confirmed: null },
});

const singleModePc45: CriterionSet = {
  id: 'iec-single-mode-pc-45',
  name: 'IEC 61300-3-35, single-mode PC, return loss 45 dB',
  ...edition2(1),
  fibre: 'single-mode',
  zones: [
    zone('A', 'core', [0, 25], nothing, nothing),
    zone('B', 'cladding', [25, 115], upTo(3, null), claddingDefects),
    ...adhesiveAndContact,
  ],
  cleanings,
};

const singleModeApc: CriterionSet = {
  id: 'iec-single-mode-apc',
  name: 'IEC 61300-3-35, single-mode APC',
  ...edition2(2),
  fibre: 'single-mode',
  zones: [
    zone('A', 'core', [0, 25], upTo(3, 4), nothing),
    zone('B', 'cladding', [25, 115], anything, claddingDefects),
    ...adhesiveAndContact,
  ],
  cleanings,
};

const singleModePc26: CriterionSet = {
  id: 'iec-single-mode-pc-26',
  name: 'IEC 61300-3-35, single-mode PC, return loss 26 dB',
  ...edition2(3),
  fibre: 'single-mode',
  zones: [
    zone('A', 'core', [0, 25], upTo(3, 2), upTo(3, 2)),
    zone(
      'B',
      'cladding',
      [25, 115],
      [
        { until: { um: 3, including: true }, most: null },
        { until: null, most: 3 },
      ],
      claddingDefects,
    ),
    ...adhesiveAndContact,
  ],
  cleanings,
};

const multimodePc: CriterionSet = {
  id: 'iec-multimode-pc',
  name: 'IEC 61300-3-35, multimode PC',
  ...edition2(4),
  fibre: 'multimode',
  zones: [
    zone('A', 'core', [0, 65], upTo(3, null), upTo(5, 4)),
    zone('B', 'cladding', [65, 115], upTo(5, null), claddingDefects),
    ...adhesiveAndContact,
  ],
  cleanings,
};

/** Zones are ours: the pictures judge the whole face alike. */
const workmanship: CriterionSet = {
  id: 'nasa-workmanship',
  name: 'Clean; no crack, chip, pit, scratch or hackle',
  edition: 'section 10.03 (2002)',
  basis: { rests: 'published', source: 'NASA workmanship pictures, section 10.03; NASA-STD-8739.5 10.2.7' },
  fibre: 'either',
  zones: [
    zone('A', 'fibre', [0, 125], nothing, nothing),
    zone('B', 'adhesive', [125, 135], nothing, nothing),
    zone('C', 'ferrule', [135, 250], nothing, nothing),
  ],
  cleanings,
};

export const shippedSets: readonly CriterionSet[] = [
  singleModePc45,
  singleModeApc,
  singleModePc26,
  multimodePc,
  workmanship,
];

/** The set that a recipe's criterion names; null where the recipe has words of its own. The shop's sets come first. */
export function criterionSetNamed(name: string, shopSets: readonly CriterionSet[] = []): CriterionSet | null {
  return [...shopSets, ...shippedSets].find((set) => set.name === name) ?? null;
}
