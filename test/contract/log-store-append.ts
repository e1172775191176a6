import type { Head } from '../../src/core/event/entry.ts';
import { equal, failureOf, type Runner } from './expect.ts';
import { held, linesAfter, textsOf } from './lines-to-store.ts';
import type { MakePlace } from './log-store.ts';

export function appendContract({ test }: Runner, makePlace: MakePlace): void {
  const openNew = async () => (await makePlace()).open();
  const first = linesAfter(null, [held('b1', 'lunch'), held('b2', '8° APC, 62.5 µm \ud800 "\u2028')]);
  const second = linesAfter(first.head, [held('b1', 'fire drill')]);
  const rival = linesAfter(first.head, [held('b1', 'flood')]);
  const summary = (value: string) => [{ key: 'batch b1', value }];

  test('an append is read back to the letter, with its head and its derived rows', async () => {
    const store = await openNew();
    equal(await store.append(null, first.lines, first.head, summary('one')), 'saved');
    equal(await store.append(first.head, second.lines, second.head, summary('two')), 'saved');
    equal(textsOf(await store.lines()), textsOf([...first.lines, ...second.lines]));
    equal(await store.lines(), [...first.lines, ...second.lines]);
    equal(await store.heads(), [second.head]);
    equal(await store.derived(''), summary('two'));
    equal(await store.count(), 3);
  });

  test('what was appended is there after the store is opened again', async () => {
    const place = await makePlace();
    const before = await place.open();
    await before.append(null, first.lines, first.head, summary('one'));
    before.close();
    const store = await place.open();
    equal(await store.lines(), first.lines);
    equal(await store.heads(), [first.head]);
    equal(await store.derived(''), summary('one'));
  });

  test('the same append again is saved already, and changes nothing', async () => {
    const store = await openNew();
    await store.append(null, first.lines, first.head, summary('one'));
    equal(await store.append(null, first.lines, first.head, summary('one')), 'saved');
    equal(await store.count(), 2);
    equal(await store.heads(), [first.head]);
  });

  test('so it is after the log went on: neither the head nor a newer row goes back', async () => {
    const store = await openNew();
    await store.append(null, first.lines, first.head, summary('one'));
    await store.append(first.head, second.lines, second.head, summary('two'));
    equal(await store.append(null, first.lines, first.head, summary('one')), 'saved');
    equal(await store.heads(), [second.head]);
    equal(await store.derived(''), summary('two'));
  });

  test('other lines after an old head are answered with moved, and nothing is written', async () => {
    const store = await openNew();
    await store.append(null, first.lines, first.head, summary('one'));
    await store.append(first.head, second.lines, second.head, summary('two'));
    equal(await store.append(first.head, rival.lines, rival.head, summary('rival')), 'moved');
    const anew = linesAfter(null, [held('b9', 'anew')]);
    equal(await store.append(null, anew.lines, anew.head, summary('anew')), 'moved');
    equal(await store.lines(), [...first.lines, ...second.lines]);
    equal(await store.heads(), [second.head]);
    equal(await store.derived(''), summary('two'));
  });

  test('lines after a head that the store never had are answered with moved', async () => {
    const store = await openNew();
    equal(await store.append(first.head, second.lines, second.head, summary('two')), 'moved');
    await store.append(null, first.lines, first.head, []);
    const elsewhere = linesAfter(null, [held('b1', 'other'), held('b2', 'history')]);
    const onwards = linesAfter(elsewhere.head, [held('b1', 'of another history')]);
    equal(await store.append(elsewhere.head, onwards.lines, onwards.head, []), 'moved');
    const ahead = linesAfter(second.head, [held('b1', 'ahead')]);
    equal(await store.append(second.head, ahead.lines, ahead.head, []), 'moved');
    equal(await store.lines(), first.lines);
  });

  test('of two windows that race, one saves and the other is told moved', async () => {
    const place = await makePlace();
    const [one, other] = [await place.open(), await place.open()];
    await one.append(null, first.lines, first.head, []);
    const answers = await Promise.all([
      one.append(first.head, second.lines, second.head, summary('second')),
      other.append(first.head, rival.lines, rival.head, summary('rival')),
    ]);
    equal([...answers].sort(), ['moved', 'saved']);
    const winner = answers[0] === 'saved' ? second : rival;
    equal(await one.lines(), [...first.lines, ...winner.lines]);
    equal(await other.lines(), [...first.lines, ...winner.lines]);
    equal(await other.heads(), [winner.head]);
    equal(await other.derived(''), summary(answers[0] === 'saved' ? 'second' : 'rival'));
  });

  test('of ten appends at once after one head, one is saved', async () => {
    const store = await openNew();
    const rivals = Array.from({ length: 10 }, (_, index) => linesAfter(null, [held('b1', `rival ${index}`)]));
    const answers = await Promise.all(rivals.map(({ lines, head }) => store.append(null, lines, head, [])));
    equal(answers.filter((answer) => answer === 'saved').length, 1);
    equal(await store.lines(), rivals[answers.indexOf('saved')]?.lines ?? []);
  });

  test('appends made one after another are saved in that order without waiting in between', async () => {
    const store = await openNew();
    const appends: ReturnType<typeof linesAfter>[] = [];
    let head: Head | null = null;
    for (let index = 0; index < 20; index += 1) {
      const next = linesAfter(head, [held('b1', `entry ${index}`)]);
      appends.push(next);
      head = next.head;
    }
    const answers = await Promise.all(appends.map((next) => store.append(next.expected, next.lines, next.head, [])));
    equal(new Set(answers).size, 1);
    equal(
      await store.lines(),
      appends.flatMap((next) => next.lines),
    );
    equal(await store.heads(), head === null ? [] : [head]);
  });

  test('an append that no store may take is refused, and nothing is written', async () => {
    const store = await openNew();
    const other = linesAfter(null, [held('b1', 'lunch'), held('b2', 'lunch')], 'log-b');
    const wrong: [Head | null, typeof first.lines, Head][] = [
      [null, [], first.head],
      [null, first.lines.slice(1), first.head],
      [null, first.lines.toReversed(), first.head],
      [null, [...first.lines, ...other.lines], first.head],
      [null, first.lines, second.head],
      [other.head, second.lines, second.head],
      [null, first.lines, other.head],
    ];
    for (const [expected, lines, head] of wrong) {
      const failure = await failureOf(store.append(expected, lines, head, summary('wrong')));
      equal(failure instanceof RangeError, true);
    }
    equal(await store.count(), 0);
    equal(await store.heads(), []);
    equal(await store.derived(''), []);
  });

  test('logs stand beside each other, each with its own head', async () => {
    const store = await openNew();
    const other = linesAfter(null, [held('b1', 'lunch')], 'log-b');
    await store.append(null, other.lines, other.head, []);
    await store.append(null, first.lines, first.head, []);
    await store.append(first.head, second.lines, second.head, []);
    equal(
      (await store.heads()).toSorted((a, b) => (a.log < b.log ? -1 : 1)),
      [second.head, other.head],
    );
    equal(await store.lines(), [...first.lines, ...second.lines, ...other.lines]);
  });
}
