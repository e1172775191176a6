import fc from 'fast-check';
import { expect, test } from 'vitest';
import { randomId } from '../../src/device/random-id.ts';

test('every byte becomes one readable character', () => {
  fc.assert(
    fc.property(fc.uint8Array({ minLength: 1, maxLength: 64 }), (bytes) => {
      const id = randomId(bytes.length, {
        getRandomValues: (target) => {
          target.set(bytes);
          return target;
        },
      });
      expect(id).toMatch(/^[0-9a-hjkmnp-tv-z]+$/);
      expect(id).toHaveLength(bytes.length);
    }),
    { numRuns: 100 },
  );
});

test('the browser source gives different ids', () => {
  expect(randomId()).toHaveLength(20);
  expect(new Set(Array.from({ length: 100 }, () => randomId())).size).toBe(100);
});
