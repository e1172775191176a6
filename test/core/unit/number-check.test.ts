import { describe, expect, test } from 'vitest';
import { checkCount, checkNumber, checkNumbers, checkTyped } from '../../../src/core/unit/number-check.ts';

const range = { lowest: 0, highest: 10 };

describe('numbers', () => {
  test.each([0, -0, 10, 0.5])('%d is taken', (value) => expect(checkNumber('sizeUm', value, range)).toBeNull());

  test.each([NaN, Infinity, -Infinity, '5' as unknown as number, null as unknown as number])(
    '%s is no number',
    (value) => {
      expect(checkNumber('sizeUm', value, range)).toEqual({ code: 'not a number', field: 'sizeUm' });
    },
  );

  test.each([-0.001, 10.001, 1e300])('%d is out of range', (found) => {
    expect(checkNumber('sizeUm', found, range)).toEqual({ code: 'out of range', field: 'sizeUm', found, ...range });
  });

  test('a count is whole', () => {
    expect(checkCount('count', 1.5, range)).toEqual({ code: 'not whole', field: 'count', found: 1.5 });
    expect(checkCount('count', 2, range)).toBeNull();
  });

  test('the first field that is refused is told', () => {
    expect(checkNumbers({ b: 20, a: NaN }, { a: range, b: range })).toEqual({ code: 'not a number', field: 'a' });
    expect(checkNumbers({ a: 1, b: 2 }, { a: range, b: range })).toBeNull();
  });

  test('unusual is not impossible', () => {
    const typing = { possible: range, usual: { lowest: 0, highest: 5 } };
    expect([5, 6].map((value) => checkTyped('a', value, typing))).toEqual(['usual', 'unusual']);
    expect(checkTyped('a', 11, typing)).toMatchObject({ code: 'out of range' });
  });
});
