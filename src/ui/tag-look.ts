import { tagColour } from '../core/recipe/colours.ts';

/** What is needed to draw a batch's tag: its number and TIA-598 colour. */
export interface TagLook {
  readonly number: number;
  /** In the language of the page. */
  readonly name: string;
  readonly fill: string;
  readonly ink: string;
}

/** The look of tag 1 to 12; `name` is the colour's in the language of the page. */
export function tagLook(tag: number, name: string): TagLook {
  const { hex, inkHex } = tagColour(tag);
  return { number: tag, name, fill: hex, ink: inkHex };
}
