import type * as z from 'zod/mini';
import { pointer, shown, type Problem, type ProblemCode } from './problem.ts';

type Issue = z.core.$ZodIssue;

const types: Readonly<Record<string, string>> = {
  object: 'an object',
  array: 'a list',
  string: 'a text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
};

/** What the patterns of the schema mean, in words. */
const patterns: Readonly<Record<string, string>> = {
  '/^[a-z0-9]+(-[a-z0-9]+)*$/': 'small letters and digits in words joined by hyphens, such as "film-3"',
  '/^[A-Z0-9][A-Z0-9.-]{0,9}$/': 'a revision such as "A" or "B.2"',
};

/** What stands at a path; only an object's own fields count. */
function valueAt(root: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>((value, key) => {
    if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return undefined;
    return (value as Record<PropertyKey, unknown>)[key];
  }, root);
}

function sizeExpected(issue: Extract<Issue, { code: 'too_small' | 'too_big' }>): string {
  const limit = Number(issue.code === 'too_small' ? issue.minimum : issue.maximum);
  const words = issue.code === 'too_small' ? ['at least', 'more than'] : ['at most', 'less than'];
  const bound = `${issue.inclusive === false ? words[1] : words[0]} ${limit}`;
  if (issue.origin === 'string') return `a text of ${bound} ${limit === 1 ? 'character' : 'characters'}`;
  if (issue.origin === 'array') return `a list of ${bound} ${limit === 1 ? 'entry' : 'entries'}`;
  return `${issue.origin === 'int' ? 'a whole number' : 'a number'} of ${bound}`;
}

const choice = (values: readonly unknown[]) =>
  values.length === 1 ? shown(values[0]) : `one of ${values.map(shown).join(', ')}`;

function judged(issue: Issue, value: unknown): { code: ProblemCode; expected: string } {
  switch (issue.code) {
    case 'invalid_type':
      return { code: 'wrong-type', expected: types[issue.expected] ?? issue.expected };
    case 'invalid_value':
      return { code: 'not-allowed', expected: choice(issue.values) };
    case 'invalid_union':
      return { code: 'not-allowed', expected: 'options' in issue ? choice(issue.options ?? []) : 'a known kind' };
    case 'too_small':
    case 'too_big': {
      const counted = issue.origin === 'string' || issue.origin === 'array';
      const empty = counted && (value === '' || (Array.isArray(value) && value.length === 0));
      return {
        code: counted ? 'wrong-length' : 'out-of-range',
        expected: empty && issue.origin === 'string' ? 'a text that is not empty' : sizeExpected(issue),
      };
    }
    case 'invalid_format':
      if (issue.format === 'starts_with') return { code: 'wrong-format', expected: 'a text that begins with "/"' };
      return { code: 'wrong-format', expected: patterns[issue.pattern ?? ''] ?? `a text like ${issue.pattern ?? '?'}` };
    default:
      return { code: 'not-allowed', expected: 'another value' };
  }
}

function sentenceFor(code: ProblemCode, field: string, expected: string, found: string): string {
  if (code === 'missing-field') return `${field} is missing; it must be ${expected}.`;
  return `${field} must be ${expected}, not ${found}.`;
}

/** The schema's issues as problems; `root` is the value that was parsed. */
export function shapeProblems(root: unknown, issues: readonly Issue[]): Problem[] {
  return issues.flatMap((issue): Problem[] => {
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => ({
        path: pointer(...issue.path, key),
        code: 'unknown-field',
        expected: 'no such field',
        found: shown(key),
        sentence: `${shown(key)} is not a field that stands here; is it misspelt?`,
      }));
    }
    const value = valueAt(root, issue.path);
    const { code: reason, expected } = judged(issue, value);
    const code = value === undefined ? 'missing-field' : reason;
    const last = issue.path.at(-1);
    const field =
      last === undefined
        ? 'The file'
        : typeof last === 'number'
          ? `Entry ${last + 1} of the list`
          : shown(String(last));
    const found = shown(value);
    return [
      { path: pointer(...issue.path), code, expected, found, sentence: sentenceFor(code, field, expected, found) },
    ];
  });
}
