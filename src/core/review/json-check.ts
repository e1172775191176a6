/** Where a parsed JSON value is not what it should be. `path` is a JSON Pointer from the value that was checked. */
export interface Mismatch {
  readonly path: string;
  readonly expected: string;
  readonly found: string;
}

/** Null where the value is what it should be. */
export type Check = (value: unknown) => Mismatch | null;

const longestShown = 60;

export function mismatch(path: string, expected: string, value: unknown): Mismatch {
  const text = value === undefined ? 'nothing' : JSON.stringify(value);
  return { path, expected, found: text.length > longestShown ? `${text.slice(0, longestShown)}…` : text };
}

const when =
  (expected: string, fits: (value: unknown) => boolean): Check =>
  (value) =>
    fits(value) ? null : mismatch('', expected, value);

export const text = when('a text', (value) => typeof value === 'string');
export const yesOrNo = when('true or false', (value) => typeof value === 'boolean');
export const number = when('a number', (value) => typeof value === 'number' && Number.isFinite(value));
export const whole = when('a whole number', Number.isSafeInteger);

export const wholeFrom = (least: number, most = Number.MAX_SAFE_INTEGER): Check =>
  when(
    most === Number.MAX_SAFE_INTEGER ? `a whole number from ${least}` : `a whole number from ${least} to ${most}`,
    (value) => typeof value === 'number' && Number.isSafeInteger(value) && value >= least && value <= most,
  );

export const oneOf = (...allowed: readonly string[]): Check =>
  when(allowed.map((one) => `"${one}"`).join(' or '), (value) => typeof value === 'string' && allowed.includes(value));

export const orNull =
  (check: Check): Check =>
  (value) =>
    value === null ? null : check(value);

// Paths are put together on the way out, so that a value that fits costs no text.
const under = (key: string | number, found: Mismatch): Mismatch => ({ ...found, path: `/${key}${found.path}` });

export const listOf =
  (check: Check): Check =>
  (value) => {
    if (!Array.isArray(value)) return mismatch('', 'a list', value);
    for (let index = 0; index < value.length; index += 1) {
      const found = check(value[index]);
      if (found) return under(index, found);
    }
    return null;
  };

export function isObject(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** An object with these fields; further fields are left alone. */
export const fields = (checks: Readonly<Record<string, Check>>): Check => {
  const named = Object.entries(checks);
  return (value) => {
    if (!isObject(value)) return mismatch('', 'an object', value);
    for (const [name, check] of named) {
      const found = check(Object.hasOwn(value, name) ? value[name] : undefined);
      if (found) return under(name, found);
    }
    return null;
  };
};

/** One check after another; the first mismatch wins. */
export const all =
  (...checks: readonly Check[]): Check =>
  (value) => {
    for (const check of checks) {
      const found = check(value);
      if (found) return found;
    }
    return null;
  };
