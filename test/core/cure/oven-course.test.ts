import { describe, expect, test } from 'vitest';
import { temperatureAtC } from '../../../src/core/cure/course.ts';
import { ovenCourse } from '../../../src/core/cure/oven-course.ts';
import type { OvenEntry } from '../../../src/core/cure/oven-entry.ts';
import { at, door, minutes, powerCut, read, set } from './bench-of-ovens.ts';

/** Temperatures (°C) at these minutes after ten, for a recipe that wants 100 °C. */
const temperatures = (entries: OvenEntry[], ...afterTen: number[]) => {
  const { segments } = ovenCourse(entries, at(0), 100);
  return afterTen.map((one) => temperatureAtC(segments, minutes(one)));
};

test('has no gaps and no end, whatever was entered', () => {
  const entries = [set(-300, 90, 600), read(-5, 88), read(3, 91), door(4), powerCut(4), set(10, 100, 60), read(10, 95)];
  const { segments } = ovenCourse(entries, at(0), 100);
  expect(segments[0]?.fromMs).toBe(-Infinity);
  expect(segments.at(-1)?.toMs).toBe(Infinity);
  for (const [index, segment] of segments.entries()) {
    expect(segment.fromMs).toBeLessThan(segment.toMs);
    if (index > 0) expect(segment.fromMs).toBe(segments[index - 1]?.toMs);
  }
});

describe('set point', () => {
  test('is assumed where nothing was entered', () => {
    expect(temperatures([], 0, 60)).toEqual([100, 100]);
    expect(ovenCourse([], at(0), 100).segments[0]?.cause.kind).toBe('assumed set point');
  });

  test('an oven whose first entry is a setting was cold until then', () => {
    expect(temperatures([set(5, 100)], 4, 5)).toEqual([23, 100]);
  });

  test('with a warm-up is neared by first order, and reached within half a degree', () => {
    const [oneConstant, arrived] = temperatures([set(0, 100, 300)], 5, 26);
    expect(oneConstant).toBeCloseTo(100 - 77 / Math.E, 10);
    expect(arrived).toBe(100);
  });

  test('changed in a warm oven starts from where the oven is', () => {
    expect(temperatures([set(-60, 80), set(0, 100, 300)], 5)[0]).toBeCloseTo(100 - 20 / Math.E, 10);
  });

  test('set anew after a night without entries starts cold, though no power cut was entered', () => {
    expect(temperatures([set(-900, 100), set(0, 100, 300)], 0, 5)[1]).toBeCloseTo(100 - 77 / Math.E, 10);
  });

  test('set long before the load simply stands', () => {
    expect(temperatures([set(-600, 100, 600)], 0)).toEqual([100]);
  });
});

describe('readings', () => {
  test('two in a row are joined by a straight line, the last is held', () => {
    expect(temperatures([set(-60, 100), read(4, 100), read(14, 92)], 3, 9, 14, 100)).toEqual([100, 96, 92, 92]);
  });

  test('above the set point are believed between readings but not afterwards', () => {
    expect(temperatures([set(-60, 100), read(4, 110), read(14, 106)], 9, 15)).toEqual([108, 100]);
  });

  test('with a warm-up drift to the set point', () => {
    expect(temperatures([set(-60, 100, 300), read(0, 80)], 5)[0]).toBeCloseTo(100 - 20 / Math.E, 10);
  });

  test('without any setting are held, up to the recipe’s set point', () => {
    expect(temperatures([read(2, 92)], 1, 3)).toEqual([100, 92]);
    expect(temperatures([read(2, 111)], 3)).toEqual([100]);
  });

  test('entered late stand where they happened, whatever the order of the list', () => {
    const late = [set(-60, 100), read(14, 92), read(4, 100)];
    expect(temperatures(late, 9)).toEqual([96]);
  });
});

describe('interruptions', () => {
  test('an opened door without a warm-up constant stays cold until a reading', () => {
    expect(temperatures([set(-60, 100), door(10), read(14, 97)], 9, 10, 13.9, 14, 20)).toEqual([100, 23, 23, 97, 97]);
  });

  test('an opened door with a warm-up constant recovers by it', () => {
    expect(temperatures([set(-60, 100, 300), door(10)], 15)[0]).toBeCloseTo(100 - 77 / Math.E, 10);
  });

  test('a power cut lasts until the oven is set again; a reading does not keep', () => {
    expect(temperatures([set(-60, 100), powerCut(10), read(12, 85), set(30, 100)], 9, 11, 12.5, 29, 30)).toEqual([
      100, 23, 23, 23, 100,
    ]);
  });

  test('two readings in a power cut are joined all the same', () => {
    expect(temperatures([set(-60, 100), powerCut(10), read(12, 90), read(16, 80)], 14, 17)).toEqual([85, 23]);
  });

  test('a power cut with a warm-up constant cools by it', () => {
    expect(temperatures([set(-60, 100, 300), powerCut(10)], 15)[0]).toBeCloseTo(23 + 77 / Math.E, 10);
  });

  test('a door in a power cut warms nothing', () => {
    expect(temperatures([set(-60, 100, 300), powerCut(10), door(12)], 40)).toEqual([23]);
  });
});

describe('what it rests on', () => {
  test('entries of another log are placed by wall clocks and marked', () => {
    const other = { ...read(5, 90), at: { ...at(5, 'tablet-b'), bench: 42 } };
    const { segments, acrossClocks } = ovenCourse([set(-60, 100), other], at(0), 100);
    expect(temperatureAtC(segments, minutes(6))).toBe(90);
    expect(acrossClocks).toBe(true);
  });

  test('what another log wrote more than a day ago leaves no mark', () => {
    const old = { ...set(-2000, 100), at: at(-2000, 'tablet-b') };
    expect(ovenCourse([old], at(0), 100).acrossClocks).toBe(false);
  });

  test('an old oven costs no more than its last day', () => {
    let looked = 0;
    const history = Array.from({ length: 5000 }, (_, index) => set(-60 * (5000 - index), 100));
    const counted = new Proxy(history, {
      get(target, key, receiver) {
        if (typeof key === 'string' && /^\d+$/.test(key)) looked += 1;
        return Reflect.get(target, key, receiver) as unknown;
      },
    });
    expect(temperatureAtC(ovenCourse(counted, at(0), 100).segments, 0)).toBe(100);
    expect(looked).toBeLessThan(30);
  });
});
