import type { CureWhy } from '../cure/cure.ts';
import type { Moment } from '../unit/moment.ts';

/** What a clock is about. */
export type ClockAbout =
  | { readonly type: 'cure'; readonly load: string; readonly station: string; readonly why: CureWhy }
  | { readonly type: 'wait'; readonly load: string }
  | { readonly type: 'polish'; readonly load: string; readonly filmUm: number }
  | {
      readonly type: 'working life';
      readonly mix: string;
      readonly lot: string;
      /** How many connectors of the batch it still limits. */
      readonly connectors: number;
      /** Index of the step that must be finished (a load: begun) before it is over. */
      readonly limitStep: number;
    };

/** At least: not before. At most: not after. Aim: this long, within a tolerance. */
export type ClockKind = 'at least' | 'at most' | 'aim';

/**
 * A clock as the log tells it: started by an entry, with absolute moments, so that nothing here depends on now.
 * All moments are in the log of `from`.
 */
export interface Clock {
  /** The same for as long as the clock runs, unique on the bench, at most 64 characters. */
  readonly id: string;
  readonly kind: ClockKind;
  readonly about: ClockAbout;
  readonly batch: string;
  readonly tag: number;
  /** Index of the step that it belongs to; of a working life: the mix step. */
  readonly step: number;
  readonly from: Moment;
  /** At least: when it may end. At most: when it must have ended. Aim: the aim. Null: as things stand, never. */
  readonly due: Moment | null;
  /** From here on it is over: past the longest dose, the working life, the tolerance. Null: never. */
  readonly over: Moment | null;
  /** Of an aim: from when it is within the tolerance. */
  readonly earliest: Moment | null;
  /** Rests on two tablets' clocks, or on a gap of unknown length. */
  readonly uncertain: boolean;
  readonly seen: boolean;
  /** When somebody last said "seen". */
  readonly seenAt: Moment | null;
}

/** The longest id that an entry can name. */
const longestId = 64;

/** `kind:thing:batch`; where that is longer than an entry can name, the kind and a hash of the whole. */
export function clockId(kind: 'cure' | 'wait' | 'polish' | 'life', thing: string, batch: string): string {
  const id = `${kind}:${thing}:${batch}`;
  return id.length <= longestId ? id : `${kind}:${hash(id, 0x811c9dc5)}${hash(id, 0x01000193)}`;
}

/** FNV-1a of 32 bits over UTF-16 units, in hex: names, not security. */
function hash(text: string, seed: number): string {
  let value = seed;
  for (let index = 0; index < text.length; index += 1) value = Math.imul(value ^ text.charCodeAt(index), 0x01000193);
  return (value >>> 0).toString(16).padStart(8, '0');
}
