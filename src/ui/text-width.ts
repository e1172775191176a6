/**
 * Advance widths of U+0020 to U+007E in hundredths of the font size, rounded up, as Atkinson Hyperlegible Next draws
 * them. Known ahead, because a drawing is laid out before its font is there.
 */
// prettier-ignore
const regular = [28,29,31,66,60,92,74,16,30,30,49,61,21,37,21,39,65,41,55,58,62,59,60,51,62,60,21,21,56,63,56,48,78,63,62,65,67,57,56,70,70,40,52,64,55,83,70,72,60,73,62,60,56,69,60,86,63,58,61,32,39,35,56,38,25,53,57,49,57,54,32,56,55,26,25,50,27,85,55,55,57,58,35,48,33,54,47,69,49,45,46,35,24,35,56];
// prettier-ignore
const bold = [32,31,39,77,61,97,73,21,34,34,49,60,28,38,28,44,66,44,58,60,63,61,63,54,63,58,28,28,57,62,57,55,79,68,65,66,69,60,57,72,71,43,57,67,56,86,72,75,63,76,65,61,61,69,65,89,69,65,62,34,44,35,59,40,29,56,60,51,60,57,37,60,58,30,26,56,32,89,58,58,60,60,38,51,38,57,53,74,54,53,51,39,26,39,54];
/** For a character outside the table: wider than nearly all, so that a guess errs towards room. */
const unknown = 75;
/** Digits are tabular, so each takes the widest one's room. */
const digit = 66;

/** Width in px of a line of text. */
export function textWidthPx(text: string, sizePx: number, weight: 'regular' | 'bold'): number {
  const table = weight === 'bold' ? bold : regular;
  let hundredths = 0;
  for (const character of text) {
    const code = character.codePointAt(0) ?? 0;
    hundredths += code >= 48 && code <= 57 ? digit : (table[code - 32] ?? unknown);
  }
  return (hundredths * sizePx) / 100;
}
