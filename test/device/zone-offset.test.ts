import { expect, test } from 'vitest';
import { zoneOffset } from '../../src/device/zone-offset.ts';

const zoneWest = (minutes: number) => ({
  Date: class {
    getTimezoneOffset(): number {
      return minutes;
    }
  },
});

test('minutes east of UTC are the browser’s minutes west, turned round', () => {
  expect(zoneOffset(zoneWest(-330))(0)).toBe(330);
  expect(zoneOffset(zoneWest(480))(0)).toBe(-480);
  expect(Object.is(zoneOffset(zoneWest(0))(0), 0)).toBe(true);
});
