import type { Recipe } from './schema.ts';

/** A colour with a name, since colour alone tells nothing to some eyes, and the ink that can be read on it. */
export interface Colour {
  readonly name: string;
  readonly hex: string;
  /** Of dark ink and white the one that stands out more. */
  readonly inkHex: string;
}

const darkInkHex = '#12202B';
const whiteHex = '#FFFFFF';

/** Relative luminance of "#RRGGBB", 0 to 1 (WCAG 2.2). */
export function luminance(hex: string): number {
  const channel = (start: number) => {
    const share = Number.parseInt(hex.slice(start, start + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  };
  return 0.2126 * channel(1) + 0.7152 * channel(3) + 0.0722 * channel(5);
}

/** Contrast ratio of two colours, 1 to 21 (WCAG 2.2). */
export function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

function colour(name: string, hex: string): Colour {
  const inkHex = contrast(hex, darkInkHex) >= contrast(hex, whiteHex) ? darkInkHex : whiteHex;
  return { name, hex, inkHex };
}

/** The twelve of TIA-598-C in its order. The shades are ours, chosen so that words on them keep 7:1. */
export const fibreColours: readonly Colour[] = [
  colour('Blue', '#1B52A8'),
  colour('Orange', '#F6931F'),
  colour('Green', '#176435'),
  colour('Brown', '#744A28'),
  colour('Slate', '#4C5863'),
  colour('White', '#FFFFFF'),
  colour('Red', '#A81E22'),
  colour('Black', '#0B0D0F'),
  colour('Yellow', '#F2D21F'),
  colour('Violet', '#6A3FA0'),
  colour('Rose', '#F5A6BC'),
  colour('Aqua', '#4FC3C7'),
];

/** A batch's tag, 1 to 12; a number outside comes round again. */
export function tagColour(tag: number): Colour {
  const index = (((tag - 1) % fibreColours.length) + fibreColours.length) % fibreColours.length;
  return fibreColours[index] ?? colour('White', whiteHex);
}

/** Colour of a fibre in a cable, with the tracer stripe that each further dozen gets (TIA-598-C); none in the first. */
export function fibreColour(fibre: number): { readonly colour: Colour; readonly stripe: Colour | null } {
  const own = tagColour(fibre);
  if (fibre <= fibreColours.length) return { colour: own, stripe: null };
  return { colour: own, stripe: tagColour(own.name === 'Black' ? 9 : 8) };
}

/** Cable jackets. A colour is only an indication: the print on the jacket governs. */
export const jacketColours: Readonly<Record<Recipe['fits']['jacketColour'], Colour>> = {
  yellow: colour('Yellow', '#F2C230'),
  orange: colour('Orange', '#F6931F'),
  aqua: colour('Aqua', '#4FC3C7'),
  slate: colour('Slate', '#4C5863'),
  violet: colour('Violet', '#6A3FA0'),
  lime: colour('Lime', '#A6D83A'),
};

const bodyBlue = colour('Blue', '#1B52A8');
const bodyGreen = colour('Green', '#176435');
const bodyBeige = colour('Beige', '#DCCBA4');
const bodyBlack = colour('Black', '#0B0D0F');

/** Connector body: green for APC, blue for other single-mode, beige for 62.5 µm, black for 50 µm. */
export function bodyColour(fits: Pick<Recipe['fits'], 'polish' | 'fibreKind'>, coreUm: number): Colour {
  if (fits.polish === 'APC') return bodyGreen;
  if (fits.fibreKind === 'single-mode') return bodyBlue;
  return coreUm > 55 ? bodyBeige : bodyBlack;
}
