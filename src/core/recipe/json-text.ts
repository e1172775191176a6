import { failed, ok, type Result } from '../unit/result.ts';
import { pointer, shown, type Problem } from './problem.ts';

/** One token of JSON (RFC 8259) after white space: string, number or literal, mark, or the end of the text. */
const tokenPattern =
  /[ \t\n\r]*(?:("[ !#-[\]-\uffff]*(?:\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4})[ !#-[\]-\uffff]*)*")|(-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?|true|false|null)|([{}[\],:])|$)/y;

interface Level {
  /** Fields seen in an object; null in a list. */
  readonly fields: Set<string> | null;
  at: string | number;
}

type Wants = 'value' | 'value or ]' | 'field' | 'field or }' | ':' | ', or end';

interface Walk {
  /** Where the text stops being JSON; null where it is JSON throughout. */
  readonly errorAt: number | null;
  readonly twice: readonly Problem[];
}

function twiceProblem(levels: readonly Level[], field: string): Problem {
  return {
    path: pointer(...levels.map((level) => level.at)),
    code: 'field-twice',
    expected: 'each field once',
    found: `${shown(field)} twice`,
    sentence: `${shown(field)} stands twice in one object; only one of the two would count.`,
  };
}

/**
 * Walks JSON text. Engines word syntax errors differently and often without a place, and JSON.parse silently keeps the
 * last of two equal fields, so that an edit of the first would change nothing.
 */
export function walkJson(text: string): Walk {
  const token = new RegExp(tokenPattern);
  const levels: Level[] = [];
  const twice: Problem[] = [];
  let wants: Wants = 'value';
  for (;;) {
    let errorAt = token.lastIndex;
    const match = token.exec(text);
    while (errorAt < text.length && ' \t\n\r'.includes(text.charAt(errorAt))) errorAt += 1;
    const bad = { errorAt, twice };
    if (!match) return bad;
    const [, string, scalar, mark] = match;
    const level = levels.at(-1);
    const done = wants === ', or end' && !level;
    if (string === undefined && scalar === undefined && mark === undefined) {
      return done ? { errorAt: null, twice } : bad;
    }
    if (done) return bad;
    if (wants === 'field' || (wants === 'field or }' && mark !== '}')) {
      if (string === undefined || !level?.fields) return bad;
      level.at = String(JSON.parse(string));
      if (level.fields.has(level.at)) twice.push(twiceProblem(levels, level.at));
      level.fields.add(level.at);
      wants = ':';
    } else if (wants === ':') {
      if (mark !== ':') return bad;
      wants = 'value';
    } else if (mark === '}' || mark === ']') {
      const closes = level?.fields ? '}' : ']';
      if (wants === 'value' || mark !== closes) return bad;
      levels.pop();
      wants = ', or end';
    } else if (wants === ', or end') {
      if (mark !== ',' || !level) return bad;
      if (typeof level.at === 'number') level.at += 1;
      wants = level.fields ? 'field' : 'value';
    } else if (mark === '{' || mark === '[') {
      levels.push(mark === '{' ? { fields: new Set(), at: '' } : { fields: null, at: 0 });
      wants = mark === '{' ? 'field or }' : 'value or ]';
    } else if (mark !== undefined) return bad;
    else wants = ', or end';
  }
}

function syntaxProblem(text: string, errorAt: number): Problem {
  const before = text.slice(0, errorAt).split('\n');
  const place = `line ${before.length}, column ${(before.at(-1) ?? '').length + 1}`;
  const character = text.slice(errorAt, errorAt + 1);
  const found = character === '' ? `the end of the file at ${place}` : `${shown(character)} at ${place}`;
  return { path: '', code: 'not-json', expected: 'JSON', found, sentence: `The file is not JSON: ${found}.` };
}

/** Reads JSON text strictly: each field once. A byte order mark at the start is let pass. */
export function readJson(text: string): Result<unknown, readonly Problem[]> {
  const plain = text.startsWith('\ufeff') ? text.slice(1) : text;
  const { errorAt, twice } = walkJson(plain);
  if (errorAt !== null) return failed([syntaxProblem(plain, errorAt)]);
  if (twice.length > 0) return failed(twice);
  try {
    return ok(JSON.parse(plain) as unknown);
  } catch {
    return failed([syntaxProblem(plain, plain.length)]);
  }
}
