import { expect, test } from 'vitest';
import { countStates, faceLooks, groupsOfTen, type ConnectorMark } from '../../src/ui/connector-state.ts';

const marks = (count: number): ConnectorMark[] =>
  Array.from({ length: count }, (_, index) => ({ number: index + 1, state: 'to do', word: 'to do' }));

test('each state has a sign of its own; only to do and current have none, and those differ by their ring', () => {
  const signs = Object.values(faceLooks).map(({ sign }) => sign);
  const drawn = signs.filter((sign) => sign !== null);
  expect(new Set(drawn).size).toBe(drawn.length);
  expect(signs.length - drawn.length).toBe(2);
  expect(faceLooks.current.ringPx).toBeGreaterThan(faceLooks['to do'].ringPx * 2);
});

test('a thousand connectors make a hundred groups that lose none', () => {
  const groups = groupsOfTen(marks(1000));
  expect(groups).toHaveLength(100);
  expect(groups.flatMap(({ marks: part }) => part)).toEqual(marks(1000));
  expect(groupsOfTen(marks(63)).at(-1)).toMatchObject({ from: 61, to: 63 });
});

test('states are counted in order of appearance', () => {
  const [first, second, third] = marks(3) as [ConnectorMark, ConnectorMark, ConnectorMark];
  const counted = countStates([first, { ...second, state: 'done', word: 'done' }, third]);
  expect(counted.map(({ word, count }) => [word, count])).toEqual([
    ['to do', 2],
    ['done', 1],
  ]);
});
