import { parseLine } from '../../src/core/event/line.ts';
import { StoreError } from '../../src/log/errors.ts';
import { equal, failureOf, type Runner } from './expect.ts';
import { held, linesAfter, textsOf } from './lines-to-store.ts';
import type { MakePlace } from './log-store.ts';

export function damageContract({ test }: Runner, makePlace: MakePlace): void {
  const made = linesAfter(null, [held('b1', 'lunch'), held('b1', 'fire drill'), held('b1', 'end of shift')]);

  test('a damaged line hides none of the others, and shows as damaged', async () => {
    const place = await makePlace();
    const store = await place.open();
    await store.append(null, made.lines, made.head, []);
    await place.plant('lines', { log: 'log-a', seq: 2, batch: 'b1', text: 7 });
    const texts = await store.linesOfBatch('b1');
    equal(texts.toSorted(), ['', ...textsOf([0, 2].flatMap((index) => made.lines[index] ?? []))].toSorted());
    equal(texts.filter((text) => !parseLine(text).ok).length, 1);
    const lines = await store.lines();
    equal(lines.length, 3);
    equal(lines[1], { log: 'log-a', seq: 2, batch: 'b1', text: '' });
  });

  test('a line that lost its batch is still among all lines', async () => {
    const place = await makePlace();
    const store = await place.open();
    await store.append(null, made.lines, made.head, []);
    await place.plant('lines', { log: 'log-a', seq: 2, text: 'torn' });
    equal((await store.lines())[1], { log: 'log-a', seq: 2, batch: '', text: 'torn' });
  });

  test('a damaged derived row is left out: it is reckoned again', async () => {
    const place = await makePlace();
    const store = await place.open();
    await store.putDerived([{ key: 'open b1', value: 'one' }]);
    await place.plant('derived', { key: 'open b2', value: { not: 'text' } });
    equal(await store.derived('open '), [{ key: 'open b1', value: 'one' }]);
  });

  test('a log with a damaged head is not continued, and its lines are never written over', async () => {
    const place = await makePlace();
    const store = await place.open();
    await store.append(null, made.lines, made.head, []);
    await place.plant('heads', { ...made.head, hash: 'torn' });
    equal(await store.heads(), []);
    const next = linesAfter(made.head, [held('b1', 'more')]);
    equal(await store.append(made.head, next.lines, next.head, []), 'moved');
    const anew = linesAfter(null, [held('b1', 'anew')]);
    const failure = await failureOf(store.append(null, anew.lines, anew.head, []));
    equal(failure instanceof StoreError && failure.fault.kind, 'broken');
    equal(await store.lines(), made.lines);
  });

  test('an append that cannot be written whole is not written at all', async () => {
    const place = await makePlace();
    const store = await place.open();
    const planted = { log: 'log-a', seq: 3, batch: 'b1', text: 'stray' };
    await place.plant('lines', planted);
    await failureOf(store.append(null, made.lines, made.head, [{ key: 'x', value: 'y' }]));
    equal(await store.lines(), [planted]);
    equal(await store.heads(), []);
    equal(await store.derived(''), []);
  });
}
