import type { Recipe } from './schema.ts';

/** Every way in which a recipe can be wrong. */
export const problemCodes = [
  // the text
  'text-too-long',
  'not-json',
  'field-twice',
  // the shape
  'missing-field',
  'unknown-field',
  'wrong-type',
  'not-allowed',
  'out-of-range',
  'wrong-length',
  'wrong-format',
  // the sense
  'step-twice',
  'defect-twice',
  'listed-twice',
  'core-kind',
  'layer-order',
  'bore-order',
  'bore-small',
  'bore-large',
  'strip-tolerance',
  'strip-nesting',
  'strip-reach',
  'retermination-length',
  'adhesive-range',
  'cure-pair-range',
  'cure-pair-order',
  'cure-pair-fall',
  'cure-pair-computed',
  'longest-dose',
  'handling-hot',
  'cure-set-point',
  'cool-down-missing',
  'mix-limit-unknown',
  'mix-limit-earlier',
  'mix-limit-cured',
  'working-life-short',
  'film-coarser',
  'film-repeated',
  'film-force',
  'film-pad',
  'film-time',
  'film-air-wet',
  'angle-missing',
  'angle-unexpected',
  'angle-unchecked',
  'angle-limits',
  'rework-defect-unknown',
  'rework-target-unknown',
  'rework-target-later',
  'rework-twice',
  'rework-crack',
  'rework-without-mix',
  'caution-missing',
  'last-step-check',
  'reading-none',
  'reading-unit',
  'reading-wavelength',
  'reading-order',
  'reading-sign',
  'load-size-missing',
  'load-size-unexpected',
  'basis-path',
  'basis-source',
  'basis-missing',
] as const;

export type ProblemCode = (typeof problemCodes)[number];

/** What is wrong at one place of a recipe, for a person who can mend it. */
export interface Problem {
  /** JSON pointer (RFC 6901) to the place; "" is the whole file. */
  readonly path: string;
  readonly code: ProblemCode;
  readonly expected: string;
  /** What stood there. */
  readonly found: string;
  /** Stands alone: names the thing, the rule and the value. */
  readonly sentence: string;
}

/** A check of what a recipe means, on a recipe whose shape is right. */
export type Rule = (recipe: Recipe) => Problem[];

/** JSON pointer (RFC 6901) to a place. */
export function pointer(...parts: readonly PropertyKey[]): string {
  return parts.map((part) => `/${String(part).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('');
}

/** Characters that steer a terminal, turn the direction of text, or do not show. */
const unprintable = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]/gu;
const longestShown = 60;
const longestPathShown = 200;

function printable(text: string): string {
  return text.replace(
    unprintable,
    (character) => `\\u${(character.codePointAt(0) ?? 0).toString(16).padStart(4, '0')}`,
  );
}

/** A value as it is shown to a person: short, on one line, nothing that could steer a terminal. */
export function shown(value: unknown): string {
  if (value === undefined) return 'nothing';
  if (typeof value === 'string') {
    const cut = value.length > longestShown ? `${value.slice(0, longestShown)}…` : value;
    return printable(JSON.stringify(cut));
  }
  if (Array.isArray(value)) return value.length === 0 ? 'an empty list' : `a list of ${value.length}`;
  if (value === null) return 'null';
  return typeof value === 'number' || typeof value === 'boolean' ? String(value) : `an ${typeof value}`;
}

/** One line for a terminal: file, path inside it, what is wrong, what was expected, what stood there. */
export function problemLine(file: string, { path, code, expected, found, sentence }: Problem): string {
  const place = path === '' ? 'whole file' : path.slice(0, longestPathShown);
  return printable(`${file}: ${place}: ${sentence} Expected: ${expected}. Found: ${found}. [${code}]`);
}
