import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Draft } from '../../../src/core/event/entry.ts';
import { factSchema } from '../../../src/core/event/facts.ts';
import { hashOfNothing, sha256 } from '../../../src/core/event/hash.ts';
import { lineOf, longestLine, makeLines, parseLine } from '../../../src/core/event/line.ts';
import { anyDraft } from './arbitrary-facts.ts';
import { held, noonMs, stamp, started } from './written.ts';

const only = <Item>(items: readonly Item[]): Item => {
  const [item] = items;
  if (item === undefined) throw new Error('nothing there');
  return item;
};

test('the first line is this text, to the letter', () => {
  const { lines, head } = makeLines(null, [started], stamp);
  const text =
    '{"log":"log-a","seq":1,"time":"1764676800000.00000","bench":1764676800000,"wall":1764676800000,"mono":1000,' +
    '"page":"page-1","offset":60,"zone":"Europe/Berlin","by":"MK","batch":"bench","type":"tabletStarted","v":1,' +
    `"data":{"app":"0.1.0"},"prev":"${hashOfNothing}"}`;
  expect(lines).toEqual([{ log: 'log-a', seq: 1, batch: 'bench', text }]);
  expect(head).toEqual({
    log: 'log-a',
    seq: 1,
    hash: sha256(text),
    time: '1764676800000.00000',
    bench: noonMs,
    wall: noonMs,
    mono: 1000,
    page: 'page-1',
  });
});

test('lines of one append share both clocks and the bench time, and follow each other by hash', () => {
  const first = makeLines(null, [started], stamp);
  const drafts = [held('b1', 'lunch'), held('b2', 'lunch')];
  const { lines, head } = makeLines(first.head, drafts, { ...stamp, wall: noonMs + 5000.9, mono: 4000.9 });
  const entries = lines.map((line) => JSON.parse(line.text));
  expect(entries.map(({ seq, bench, wall, mono }) => ({ seq, bench, wall, mono }))).toEqual([
    { seq: 2, bench: noonMs + 3000, wall: noonMs + 5000, mono: 4000 },
    { seq: 3, bench: noonMs + 3000, wall: noonMs + 5000, mono: 4000 },
  ]);
  expect(entries.map((entry) => entry.prev)).toEqual([sha256(only(first.lines).text), sha256(only(lines).text)]);
  expect(head.seq).toBe(3);
});

test('a time that the person adds moves the bench time of its own line', () => {
  const first = makeLines(null, [started], stamp);
  const added: Draft = { batch: 'bench', type: 'timeStated', v: 1, data: { addedS: 600 } };
  const { head } = makeLines(first.head, [added, held('b1', 'lunch')], stamp);
  expect(head.bench).toBe(noonMs + 600_000);
});

test('new entries come after what was seen of other logs', () => {
  const { head } = makeLines(null, [started], { ...stamp, seen: '1764676900000.00003' });
  expect(head.time).toBe('1764676900000.00004');
  expect(head.bench).toBe(noonMs);
});

describe('what cannot be written is refused before it is stored', () => {
  const first = makeLines(null, [started], stamp);
  test('nothing', () => {
    expect(() => makeLines(null, [], stamp)).toThrow('at least one entry');
    expect(() => makeLines(first.head, [], stamp)).toThrow('at least one entry');
  });
  test('the head of another log', () => {
    expect(() => makeLines(first.head, [started], { ...stamp, log: 'log-b' })).toThrow('log-b');
  });
  test('a text that is too long', () => {
    expect(() => makeLines(null, [held('b1', 'x'.repeat(201))], stamp)).toThrow('/data/reason');
  });
  test('a number that JSON does not have', () => {
    const added: Draft = { batch: 'bench', type: 'timeStated', v: 1, data: { addedS: Number.NaN } };
    expect(() => makeLines(null, [added], stamp)).toThrow('/data/addedS');
  });
});

test('law: what was written is read back, whatever it says', () => {
  fc.assert(
    fc.property(fc.array(anyDraft, { minLength: 1, maxLength: 5 }), (drafts) => {
      const { lines } = makeLines(null, drafts, stamp);
      lines.forEach((line, index) => {
        const read = parseLine(line.text);
        const { batch, type, v, data } = read.ok ? read.value : ({} as Record<string, never>);
        expect({ batch, type, v, data }).toStrictEqual(drafts[index]);
        expect(JSON.stringify(JSON.parse(line.text))).toBe(line.text);
        expect(lineOf(line.text)).toEqual({ ok: true, value: line });
      });
    }),
    { numRuns: 300 },
  );
});

test('every type of fact is among those tried', () => {
  const tried = new Set(fc.sample(anyDraft, { numRuns: 1000, seed: 1 }).map((draft) => draft.type));
  expect(factSchema.def.options.map((option) => option.shape.type.def.values[0])).toEqual(
    expect.arrayContaining([...tried]),
  );
  expect(tried.size).toBe(factSchema.def.options.length);
});

describe('a line that is no entry', () => {
  const text = only(makeLines(null, [held('b1', 'lunch')], stamp).lines).text;
  const changed = (change: object) => JSON.stringify({ ...JSON.parse(text), ...change });

  test('of a type that nobody knows is kept apart, with its envelope', () => {
    expect(parseLine(changed({ type: 'fibreSung' }))).toMatchObject({
      ok: false,
      error: { kind: 'unknown', type: 'fibreSung', v: 1, envelope: { log: 'log-a', seq: 1, batch: 'b1' } },
    });
    expect(lineOf(changed({ type: 'fibreSung' }))).toMatchObject({ ok: true, value: { log: 'log-a', seq: 1 } });
  });
  test('of a later version likewise, even if its data look different', () => {
    const later = changed({ v: 2, data: { because: 'lunch' } });
    expect(parseLine(later)).toMatchObject({ ok: false, error: { kind: 'unknown', type: 'batchHeld', v: 2 } });
  });
  test.each([
    { what: 'nothing', bad: '', why: 'no JSON' },
    { what: 'half a line', bad: text.slice(0, 90), why: 'no JSON' },
    { what: 'a number', bad: '7', why: '/: invalid_type' },
    { what: 'null', bad: 'null', why: '/: invalid_type' },
    { what: 'a list', bad: `[${text}]`, why: '/: invalid_type' },
    { what: 'seq 0', bad: changed({ seq: 0 }), why: '/seq' },
    { what: 'a time that does not sort', bad: changed({ time: '1764676800000.1' }), why: '/time' },
    { what: 'no batch', bad: changed({ batch: undefined }), why: '/batch' },
    { what: 'a hash in capitals', bad: changed({ prev: hashOfNothing.toUpperCase() }), why: '/prev' },
    { what: 'data that do not fit the type', bad: changed({ data: { reason: 5 } }), why: '/data/reason' },
    { what: 'data that are missing', bad: changed({ data: undefined }), why: '/data' },
    { what: 'a megabyte', bad: `${text}${' '.repeat(longestLine)}`, why: 'at most 1000000' },
  ])('$what is damaged', ({ bad, why }) => {
    const read = parseLine(bad);
    expect(read).toMatchObject({ ok: false, error: { kind: 'damaged', why: expect.stringContaining(why) } });
    expect(lineOf(bad).ok).toBe(false);
  });
  test('a deep nest is damaged, not a crash', () => {
    const deep = `${'['.repeat(200_000)}${']'.repeat(200_000)}`;
    expect(parseLine(deep)).toMatchObject({ ok: false, error: { kind: 'damaged' } });
  });
  test('law: no text makes it throw', () => {
    const cut = fc.tuple(fc.nat(text.length), fc.string({ unit: 'binary', maxLength: 3 }));
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.json(), cut), (bad) => {
        const candidate = typeof bad === 'string' ? bad : text.slice(0, bad[0]) + bad[1] + text.slice(bad[0] + 1);
        expect(typeof parseLine(candidate).ok).toBe('boolean');
      }),
      { numRuns: 150 },
    );
  });
});
