import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ChainCheck, verify, type LogReport } from '../../../src/core/event/chain.ts';
import type { Draft, Line } from '../../../src/core/event/entry.ts';
import { sha256 } from '../../../src/core/event/hash.ts';
import { makeLines } from '../../../src/core/event/line.ts';
import { held, noonMs, stamp, started, written } from './written.ts';

const { lines, head } = written([started, held('b1', 'lunch'), held('b2', 'fire drill'), held('b1', 'end of shift')]);

function reportOf(given: readonly Line[], ...known: Parameters<typeof verify>[1] & object): LogReport | undefined {
  return verify(given, known).get('log-a');
}

/** Line `seq` again, with other text under the same hash chain: `change` works on its parsed text. */
function forged(seq: number, change: (entry: Record<string, unknown>) => object): Line[] {
  return lines.map((line) => {
    if (line.seq !== seq) return line;
    const entry = JSON.parse(line.text);
    return { ...line, text: JSON.stringify({ ...entry, ...change(entry) }) };
  });
}

const without = (seq: number) => lines.filter((line) => line.seq !== seq);

describe('a log that nobody touched', () => {
  test('is unbroken, and its end is not confirmed', () => {
    expect(reportOf(lines)).toEqual({ state: 'unbroken', head, end: 'not confirmed' });
  });
  test('is confirmed by a head that was written down', () => {
    expect(head && reportOf(lines, head)).toEqual({ state: 'unbroken', head, end: 'confirmed' });
  });
  test('goes further than an older head, so its end is not confirmed', () => {
    const older = { log: 'log-a', seq: 2, hash: sha256(lines[1]?.text ?? '') };
    expect(reportOf(lines, older)).toMatchObject({ state: 'unbroken', end: 'not confirmed' });
  });
  test('may come with lines twice, page by page, and mixed with another log', () => {
    const other = written([started, held('b9', 'lunch')], { log: 'log-b', page: 'page-9' });
    const check = new ChainCheck();
    for (const line of [...lines.slice(0, 2), ...other.lines, ...lines, ...other.lines]) check.add(line);
    expect([...check.reports()].map(([log, report]) => [log, report.state])).toEqual([
      ['log-a', 'unbroken'],
      ['log-b', 'unbroken'],
    ]);
  });
  test('may hold entries of a type that this version does not know', () => {
    const [first, second] = written([started, held('b1', 'lunch')]).lines;
    const sung = (second?.text ?? '').replace('batchHeld', 'fibreSung');
    expect(reportOf([first, second && { ...second, text: sung }].filter((line) => line !== undefined))).toMatchObject({
      state: 'unbroken',
    });
  });
  test('reckons bench time again over starts, sleeps, clock changes and stated times', () => {
    const steps: { draft: Draft; wall: number; mono: number; page: string }[] = [
      { draft: started, wall: 0, mono: 900, page: 'p1' },
      { draft: { batch: 'bench', type: 'clockSet', v: 1, data: {} }, wall: -3_600_000, mono: 5900, page: 'p1' },
      { draft: { batch: 'bench', type: 'tabletWoke', v: 1, data: {} }, wall: -1_800_000, mono: 5950, page: 'p1' },
      {
        draft: { batch: 'bench', type: 'timeStated', v: 1, data: { addedS: 60.5 } },
        wall: -1_790_000,
        mono: 16000,
        page: 'p1',
      },
      { draft: started, wall: -1_700_000, mono: 30, page: 'p2' },
    ];
    let at: ReturnType<typeof makeLines>['head'] | null = null;
    const all = steps.flatMap(({ draft, wall, mono, page }) => {
      const made = makeLines(at, [draft], { ...stamp, wall: noonMs + wall, mono, page });
      at = made.head;
      return made.lines;
    });
    expect(reportOf(all)).toMatchObject({
      state: 'unbroken',
      head: { bench: noonMs + 5000 + 1_800_000 + 70_550 + 90_000 },
    });
  });
});

describe('a log that was touched', () => {
  test.each([
    { what: 'changed words', given: forged(2, () => ({ data: { reason: 'munch' } })), seq: 3, fault: 'changed before' },
    {
      what: 'a spare blank',
      given: lines.map((line) => (line.seq === 2 ? { ...line, text: `${line.text} ` } : line)),
      seq: 3,
      fault: 'changed before',
    },
    { what: 'a missing line', given: without(3), seq: 4, fault: 'line missing' },
    { what: 'a missing first line', given: without(1), seq: 2, fault: 'line missing' },
    {
      what: 'swapped lines',
      given: [0, 2, 1, 3].flatMap((index) => lines[index] ?? []),
      seq: 3,
      fault: 'line missing',
    },
    {
      what: 'another text under the same number',
      given: [...lines, ...forged(2, () => ({ by: 'XX' })).slice(1, 2)],
      seq: 2,
      fault: 'two texts',
    },
    {
      what: 'a line filed under another batch',
      given: lines.map((line) => (line.seq === 2 ? { ...line, batch: 'b7' } : line)),
      seq: 2,
      fault: 'filed wrongly',
    },
    {
      what: 'a torn line',
      given: lines.map((line) => (line.seq === 4 ? { ...line, text: line.text.slice(0, 80) } : line)),
      seq: 4,
      fault: 'damaged',
    },
    {
      what: 'a last line whose bench time was turned back',
      given: forged(4, ({ bench }) => ({ bench: Number(bench) - 1 })),
      seq: 4,
      fault: 'bench time wrong',
    },
    {
      what: 'a last line with the time of the line before',
      given: forged(4, () => ({ time: `${noonMs + 2000}.00000` })),
      seq: 4,
      fault: 'time not rising',
    },
    {
      what: 'a last line whose time does not rise',
      given: forged(4, () => ({ time: `${noonMs}.00000` })),
      seq: 4,
      fault: 'time not rising',
    },
    {
      what: 'a first line with a bench time of its own',
      given: forged(1, () => ({ bench: noonMs - 5 })),
      seq: 1,
      fault: 'bench time wrong',
    },
  ])('$what: told at line $seq', ({ given, seq, fault }) => {
    expect(reportOf(given)).toMatchObject({ state: 'broken', at: { log: 'log-a', seq }, fault });
  });
  test('the first break is the one that is told, with both hashes', () => {
    const given = forged(2, () => ({ by: 'XX' })).filter((line) => line.seq !== 4);
    const report = reportOf(given);
    expect(report).toMatchObject({
      fault: 'changed before',
      why: expect.stringContaining(sha256(given[1]?.text ?? '')),
    });
  });
  test('a cut tail shows only against a head that was written down', () => {
    expect(reportOf(without(4))).toMatchObject({ state: 'unbroken', end: 'not confirmed' });
    expect(head && reportOf(without(4), head)).toMatchObject({ state: 'cut', head: { seq: 3 }, known: { seq: 4 } });
    expect(head && reportOf([], head)).toEqual({ state: 'cut', head: null, known: head });
  });
  test('a log written anew from its first line shows against a head that was written down', () => {
    const anew = written([started, held('b1', 'lunch'), held('b2', 'fire drill'), held('b1', 'early end')]);
    expect(head && reportOf(anew.lines, head)).toMatchObject({ state: 'other history', head: anew.head });
  });
});

describe('laws of the chain', () => {
  const anyLog = fc
    .array(fc.string({ maxLength: 20 }), { minLength: 2, maxLength: 8 })
    .map((reasons) => written(reasons.map((reason, index) => held(`b${index % 3}`, reason))).lines);

  test('law: any changed character before the last line is found', () => {
    fc.assert(
      fc.property(anyLog, fc.nat(), fc.nat(), fc.integer({ min: 0, max: 0x7f }), (log, atLine, atUnit, unit) => {
        const target = log[atLine % (log.length - 1)];
        fc.pre(target !== undefined);
        const index = atUnit % target.text.length;
        const text = target.text.slice(0, index) + String.fromCharCode(unit) + target.text.slice(index + 1);
        fc.pre(text !== target.text);
        expect(reportOf(log.map((line) => (line === target ? { ...line, text } : line)))).toMatchObject({
          state: 'broken',
        });
      }),
      { numRuns: 250 },
    );
  });

  test('law: a removed line before the last is found', () => {
    fc.assert(
      fc.property(anyLog, fc.nat(), (log, at) => {
        expect(reportOf(log.toSpliced(at % (log.length - 1), 1))).toMatchObject({ state: 'broken' });
      }),
      { numRuns: 100 },
    );
  });

  test('law: two swapped lines are found, also when their numbers were swapped with them', () => {
    fc.assert(
      fc.property(anyLog, fc.nat(), fc.nat(), (log, one, two) => {
        const a = log[one % log.length];
        const b = log[two % log.length];
        fc.pre(a !== undefined && b !== undefined && a !== b);
        const swapped = log.map((line) => (line === a ? b : line === b ? a : line));
        expect(reportOf(swapped)).toMatchObject({ state: 'broken' });
        const renumbered = swapped.map((line, index) => ({ ...line, seq: index + 1 }));
        expect(reportOf(renumbered)).toMatchObject({ state: 'broken' });
      }),
      { numRuns: 100 },
    );
  });

  test('law: what makeLines writes is unbroken, whatever the clocks do', () => {
    const clocks = fc.record({
      wall: fc.integer({ min: 0, max: 4_000_000_000_000 }),
      mono: fc.double({ min: 0, max: 1e9, noNaN: true }),
      page: fc.constantFrom('p1', 'p2'),
    });
    fc.assert(
      fc.property(fc.array(clocks, { minLength: 1, maxLength: 12 }), (readings) => {
        let at: ReturnType<typeof makeLines>['head'] | null = null;
        const all = readings.flatMap((reading) => {
          const made = makeLines(at, [started, held('b1', 'lunch')], { ...stamp, ...reading });
          at = made.head;
          return made.lines;
        });
        expect(reportOf(all)).toMatchObject({ state: 'unbroken', head: { seq: readings.length * 2 } });
      }),
      { numRuns: 100 },
    );
  });
});
