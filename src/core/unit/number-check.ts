/** Both ends belong to it. */
export interface NumberRange {
  readonly lowest: number;
  readonly highest: number;
}

/** Why a number was not taken; `field` is its name, with its unit. */
export type NumberRefusal<Field extends string = string> =
  | { readonly code: 'not a number'; readonly field: Field }
  | { readonly code: 'not whole'; readonly field: Field; readonly found: number }
  | ({ readonly code: 'out of range'; readonly field: Field; readonly found: number } & NumberRange);

/** Null where the number is finite and inside the range. */
export function checkNumber<Field extends string>(
  field: Field,
  value: number,
  range: NumberRange,
): NumberRefusal<Field> | null {
  if (!Number.isFinite(value)) return { code: 'not a number', field };
  if (value >= range.lowest && value <= range.highest) return null;
  return { code: 'out of range', field, found: value, lowest: range.lowest, highest: range.highest };
}

/** As `checkNumber`, for a count. */
export function checkCount<Field extends string>(
  field: Field,
  value: number,
  range: NumberRange,
): NumberRefusal<Field> | null {
  const refusal = checkNumber(field, value, range);
  return refusal ?? (Number.isInteger(value) ? null : { code: 'not whole', field, found: value });
}

/** The first field that is refused, in the order of the ranges. */
export function checkNumbers<Field extends string>(
  values: Readonly<Record<NoInfer<Field>, number>>,
  ranges: Readonly<Record<Field, NumberRange>>,
): NumberRefusal<Field> | null {
  for (const field of Object.keys(ranges) as Field[]) {
    const refusal = checkNumber(field, values[field], ranges[field]);
    if (refusal) return refusal;
  }
  return null;
}

/** What may be typed, and what is believed without a question. */
export interface TypingRange {
  readonly possible: NumberRange;
  readonly usual: NumberRange;
}

/** A refusal, or whether the value is usual; an unusual one is asked about before it is taken. */
export function checkTyped<Field extends string>(
  field: Field,
  value: number,
  { possible, usual }: TypingRange,
): NumberRefusal<Field> | 'usual' | 'unusual' {
  const refusal = checkNumber(field, value, possible);
  if (refusal) return refusal;
  return checkNumber(field, value, usual) === null ? 'usual' : 'unusual';
}
