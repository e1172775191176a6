import type { Bead, BeadState } from '../../../src/ui/fibre-line-layout.ts';
import type { PictureWords } from '../../../src/ui/picture-words.ts';
import { tagLook, type TagLook } from '../../../src/ui/tag-look.ts';

/** Invented data of a shift. */

export const tags = {
  blue: tagLook(1, 'Blue'),
  orange: tagLook(2, 'Orange'),
  green: tagLook(3, 'Green'),
  brown: tagLook(4, 'Brown'),
  yellow: tagLook(9, 'Yellow'),
  violet: tagLook(10, 'Violet'),
} satisfies Record<string, TagLook>;

const labels = [
  'Prep',
  'Strip',
  'Clean',
  'Fill',
  'Cure',
  'Cool',
  'Cleave',
  'Air',
  '15 µm',
  '9 µm',
  '3 µm',
  '1 µm',
  'Inspect',
  'Measure',
];

/** Beads of a plain recipe, with everything before `at` done. */
export function beadsAt(at: number, state: BeadState, more: Partial<Bead> = {}): Bead[] {
  return labels.map((label, index) => ({
    kind: label === 'Cure' || label === 'Cool' ? 'timed' : 'step',
    share: label === 'Cure' ? 20 : label === 'Cool' ? 7 : 0,
    label,
    state: index < at ? 'done' : index === at ? state : 'to do',
    ...(index === at ? more : {}),
  }));
}

const length = ({ nominalMm, toleranceMm }: { nominalMm: number; toleranceMm: number }): string =>
  `${nominalMm} ± ${toleranceMm} mm`;

export const pictureWords: PictureWords = {
  strip: {
    name: 'Cable end with the jacket, the buffer and the coating taken off, to scale',
    jacketOff: (mm) => `${length(mm)} jacket off`,
    strengthMember: (mm) => `${length(mm)} aramid`,
    bareGlass: (mm) => `${length(mm)} bare glass`,
    scale: (times) => `Lengths to scale, diameters ${Number(times.toFixed(1))} times larger.`,
  },
  films: {
    name: (step) => `Film ${step.filmUm} µm on its pad`,
    film: (um) => `${um} µm`,
    material: (material) => material,
    pad: (pad) =>
      pad.kind === 'rubber'
        ? pad.hardnessMinShoreA === pad.hardnessMaxShoreA
          ? `Pad ${pad.hardnessMinShoreA} Shore A`
          : `Pad ${pad.hardnessMinShoreA} to ${pad.hardnessMaxShoreA} Shore A`
        : pad.kind === 'glass'
          ? 'Glass plate'
          : 'By hand, in air',
    force: ({ forceMinN, forceMaxN }) => `${forceMinN} to ${forceMaxN} N each`,
    liquid: (liquid) => (liquid === 'water' ? 'Water' : 'Dry'),
    until: (until) =>
      until.kind === 'time'
        ? `${until.aimS} ± ${until.toleranceS} s`
        : until.kind === 'strokes'
          ? `${until.figureEights} figures of eight`
          : until.sign,
  },
  tray: {
    name: (count, temperature) => `Oven tray with ${count} connectors at ${temperature}`,
    celsius: (temperature) => `${temperature} °C`,
    lowest: 'lowest',
    setPoint: 'set',
    reading: 'read',
    highest: 'highest',
    handling: 'handle below',
    dose: (dose) => `Dose ${Math.floor(dose * 100)} %`,
    cured: 'cured',
    longest: 'longest',
  },
  endFace: {
    name: 'End face with its zones',
    core: 'core',
    cladding: 'cladding',
    ferrule: 'ferrule',
    size: ({ innerDiameterUm, outerDiameterUm }) =>
      innerDiameterUm === 0 ? `${outerDiameterUm} µm across` : `${innerDiameterUm} to ${outerDiameterUm} µm`,
  },
  connector: {
    name: {
      parts: 'Parts on the cable in their order',
      fill: 'Ferrule filled with adhesive',
      crimp: 'Crimp sleeve over the aramid',
      cleave: 'Fibre scored just above the bead',
      'clean glass': 'Bare glass wiped once towards its tip',
      'clean end face': 'End face wiped',
    },
    boot: 'Boot',
    crimpSleeve: 'Crimp sleeve',
    body: 'Body',
    ferrule: (mm) => `Ferrule ${mm} mm`,
    adhesive: 'Adhesive',
    bead: 'Bead',
    score: 'Score here, once',
    wipe: 'Lint-free wipe',
  },
};
