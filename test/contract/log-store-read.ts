import type { Head, Line } from '../../src/core/event/entry.ts';
import { StoreError } from '../../src/log/errors.ts';
import { equal, failureOf, type Runner } from './expect.ts';
import { held, linesAfter, textsOf } from './lines-to-store.ts';
import type { MakePlace } from './log-store.ts';

const perAppend = 250;

/** 5,000 lines of two logs over 40 batches, in appends of 250. */
function manyAppends() {
  return ['log-a', 'log-b'].flatMap((log) => {
    let head: Head | null = null;
    return Array.from({ length: 10 }, (_, append) => {
      const drafts = Array.from({ length: perAppend }, (_, index) =>
        held(`b${index % 40}`, `${log} ${append} ${index}`),
      );
      const next = linesAfter(head, drafts, log);
      head = next.head;
      return next;
    });
  });
}

export function readContract({ test }: Runner, makePlace: MakePlace): void {
  const openNew = async () => (await makePlace()).open();

  test('an empty store has nothing, and says so', async () => {
    const store = await openNew();
    equal(await store.heads(), []);
    equal(await store.count(), 0);
    equal(await store.lines(), []);
    equal(await store.linesOfBatch('bench'), []);
    equal(await store.derived(''), []);
    equal(await store.derivedBetween('a', 'z'), []);
  });

  test('5,000 lines are found by batch and by page', async () => {
    const store = await openNew();
    const appends = manyAppends();
    for (const { expected, lines, head } of appends) equal(await store.append(expected, lines, head, []), 'saved');
    const all = appends.flatMap(({ lines }) => lines);
    equal(await store.count(), 5000);

    const ofBatch = await store.linesOfBatch('b7');
    equal(ofBatch.toSorted(), textsOf(all.filter((line) => line.batch === 'b7')).toSorted());
    equal(await store.linesOfBatch('b'), []);

    const paged: Line[] = [];
    for (;;) {
      const page = await store.lines(paged.at(-1), 900);
      paged.push(...page);
      if (page.length < 900) break;
    }
    equal(textsOf(paged), textsOf(all));
    equal(textsOf(await store.lines({ log: 'log-a', seq: 9 }, 2)), textsOf(all.slice(9, 11)));
    equal(await store.lines({ log: 'log-b', seq: 2500 }), []);
  });

  test('derived rows are written, replaced and removed with an append', async () => {
    const store = await openNew();
    const { lines, head } = linesAfter(null, [held('b1', 'lunch')]);
    const next = linesAfter(head, [held('b1', 'end of shift')]);
    const rows = [
      { key: 'open b2', value: 'two' },
      { key: 'open b1', value: '{"µ":1}' },
    ];
    await store.append(null, lines, head, rows);
    equal(await store.derived('open '), rows.toReversed());
    await store.append(head, next.lines, next.head, [
      { key: 'open b1', remove: true },
      { key: 'open b2', value: 'three' },
      { key: 'open b3', remove: true },
    ]);
    equal(await store.derived('open '), [{ key: 'open b2', value: 'three' }]);
  });

  test('derived rows are found by how their key begins, and by a range whose end is not in it', async () => {
    const store = await openNew();
    const keys = ['a', 'day 2026-11-29', 'day 2026-11-30', 'day 2026-11-30 b', 'day 2026-12-01', 'days', 'Z'];
    await store.putDerived(keys.map((key) => ({ key, value: `of ${key}` })));
    const keysOf = (rows: { key: string }[]) => rows.map(({ key }) => key);
    equal(keysOf(await store.derived('')), keys.toSorted());
    equal(keysOf(await store.derived('day ')), keys.slice(1, 5));
    equal(keysOf(await store.derived('day 2026-11-30')), keys.slice(2, 4));
    equal(keysOf(await store.derived('nothing')), []);
    equal(keysOf(await store.derivedBetween('day 2026-11-29', 'day 2026-12-01')), keys.slice(1, 4));
    equal(await store.derivedBetween('day 2026-11-30', 'day 2026-11-30'), []);
    equal(await store.derivedBetween('z', 'a'), []);
    equal(await store.derivedBetween('a', 'a\u0000'), [{ key: 'a', value: 'of a' }]);
  });

  test('rows that are reckoned again touch no entry', async () => {
    const store = await openNew();
    const { lines, head } = linesAfter(null, [held('b1', 'lunch')]);
    await store.append(null, lines, head, [{ key: 'x', value: 'old' }]);
    await store.putDerived([
      { key: 'x', remove: true },
      { key: 'y', value: 'new' },
    ]);
    await store.putDerived([]);
    equal(await store.derived(''), [{ key: 'y', value: 'new' }]);
    equal(await store.lines(), lines);
    equal(await store.heads(), [head]);
  });

  test('a long line is kept whole', async () => {
    const store = await openNew();
    const hash = 'a'.repeat(64);
    const text = 'µ'.repeat(200_000);
    const { lines, head } = linesAfter(null, [{ batch: 'bench', type: 'recipeTaken', v: 1, data: { hash, text } }]);
    await store.append(null, lines, head, []);
    equal(await store.linesOfBatch('bench'), textsOf(lines));
  });

  test('a store that was closed says so', async () => {
    const store = await openNew();
    store.close();
    store.close();
    const { lines, head } = linesAfter(null, [held('b1', 'lunch')]);
    for (const use of [() => store.heads(), () => store.append(null, lines, head, [])]) {
      const failure = await failureOf(use());
      equal(failure instanceof StoreError && failure.fault.kind, 'broken');
    }
  });
}
