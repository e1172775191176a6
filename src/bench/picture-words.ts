import type { PictureWords } from '../ui/picture-words.ts';
import { decimals } from '../words/format.ts';
import type { Words } from '../words/index.ts';
import { rangeWords } from './step-words.ts';

/** The words of a step's drawing, in the language of the page. */
export function pictureWords(words: Words): PictureWords {
  const say = words.picture;
  const notes = words.batch.notes;
  const length = ({ nominalMm, toleranceMm }: { nominalMm: number; toleranceMm: number }) =>
    `${decimals(nominalMm, 2)} ± ${decimals(toleranceMm, 2)} mm`;
  return {
    strip: {
      name: say.strip.name,
      jacketOff: (mm) => say.strip.jacketOff(length(mm)),
      strengthMember: (mm) => say.strip.strengthMember(length(mm)),
      bareGlass: (mm) => say.strip.bareGlass(length(mm)),
      scale: (times) => say.strip.scale(decimals(times, 1)),
    },
    films: {
      name: (step) => say.films.name(decimals(step.filmUm, 2)),
      film: (um) => say.films.film(decimals(um, 2)),
      material: (material) => material,
      pad: (pad) =>
        pad.kind === 'rubber'
          ? say.films.pad(rangeWords(pad.hardnessMinShoreA, pad.hardnessMaxShoreA))
          : pad.kind === 'glass'
            ? notes.padGlass
            : notes.padHand,
      force: (step) => say.films.force(rangeWords(step.forceMinN, step.forceMaxN)),
      liquid: (liquid) => (liquid === 'water' ? say.films.water : say.films.dry),
      until: (until) =>
        until.kind === 'time'
          ? say.films.time(decimals(until.aimS, 0), decimals(until.toleranceS, 0))
          : until.kind === 'strokes'
            ? say.films.strokes(until.figureEights)
            : until.sign,
    },
    tray: {
      ...say.tray,
      dose: (dose) => say.tray.dose(Math.floor(dose * 100 + 1e-9)),
      celsius: (c) => say.tray.celsius(decimals(c, 1)),
    },
    endFace: say.endFace,
    connector: { ...say.connector, ferrule: (mm) => say.connector.ferrule(decimals(mm, 2)) },
  };
}
