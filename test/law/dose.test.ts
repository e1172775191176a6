import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { cureOf } from '../../src/core/cure/cure.ts';
import { cureDoseLaw, minutesToCure, type CureLaw } from '../../src/core/cure/cure-time.ts';
import { segmentTemperatureC, type Course, type Segment, type Shape } from '../../src/core/cure/course.ts';
import { integrate, solve } from '../../src/core/cure/dose.ts';
import type { OvenEntry } from '../../src/core/cure/oven-entry.ts';
import type { Moment } from '../../src/core/unit/moment.ts';

const runs = { numRuns: 200 };
const minuteMs = 60_000;

/** Pairs whose time falls as temperature rises, as the recipe rules ask. */
const adhesive: fc.Arbitrary<CureLaw & { longestDose: number }> = fc
  .record({
    lowestC: fc.integer({ min: 40, max: 90 }),
    steps: fc.array(
      fc.record({ upC: fc.integer({ min: 1, max: 25 }), faster: fc.double({ min: 1.05, max: 3, noNaN: true }) }),
      {
        minLength: 1,
        maxLength: 5,
      },
    ),
    longestMinutes: fc.double({ min: 20, max: 600, noNaN: true }),
    longestDose: fc.double({ min: 1, max: 5, noNaN: true }),
  })
  .map(({ lowestC, steps, longestMinutes, longestDose }) => {
    let temperatureC = lowestC;
    let minutes = longestMinutes;
    const curePairs = steps.map(({ upC, faster }) => {
      temperatureC += upC;
      minutes /= faster;
      return { temperatureC, minutes };
    });
    return { curePairs, lowestC, highestC: temperatureC + 20, longestDose };
  });

const temperature = fc.double({ min: 15, max: 180, noNaN: true });
const shape: fc.Arbitrary<Shape> = fc.oneof(
  fc.record({ kind: fc.constant('constant' as const), temperatureC: temperature }),
  fc.record({ kind: fc.constant('linear' as const), startC: temperature, endC: temperature }),
  fc.record({
    kind: fc.constant('lag' as const),
    startC: temperature,
    towardC: temperature,
    constantMs: fc.integer({ min: 1000, max: 30 * minuteMs }),
  }),
);
const course: fc.Arbitrary<Course> = fc
  .array(fc.record({ lastsMs: fc.integer({ min: 1, max: 60 * minuteMs }), shape }), { minLength: 1, maxLength: 6 })
  .map((parts) => {
    let fromMs = 0;
    return parts.map(({ lastsMs, shape }): Segment => {
      const segment = { fromMs, toMs: fromMs + lastsMs, shape };
      fromMs = segment.toMs;
      return segment;
    });
  });
const endMs = (one: Course) => one.at(-1)?.toMs ?? 0;
const within = fc.double({ min: 0, max: 1, noNaN: true });

describe('dose', () => {
  test('never falls with time', () => {
    fc.assert(
      fc.property(adhesive, course, fc.array(within, { minLength: 2, maxLength: 40 }), (law, one, shares) => {
        const times = shares.map((share) => Math.round(share * endMs(one))).sort((a, b) => a - b);
        const doses = times.map((ms) => integrate(one, cureDoseLaw(law), 0, ms));
        for (const [index, dose] of doses.entries()) expect(dose).toBeGreaterThanOrEqual(doses[index - 1] ?? 0);
      }),
      runs,
    );
  });

  test('reaches exactly one at every pair’s time', () => {
    fc.assert(
      fc.property(adhesive, (law) => {
        for (const { temperatureC, minutes } of law.curePairs) {
          const hold: Course = [{ fromMs: 0, toMs: Infinity, shape: { kind: 'constant', temperatureC } }];
          expect(integrate(hold, cureDoseLaw(law), 0, minutes * minuteMs)).toBe(1);
          expect(solve(hold, cureDoseLaw(law), 0, 1)).toBe(minutes * minuteMs);
        }
      }),
      runs,
    );
  });

  test('of an interval is the sum of its parts', () => {
    fc.assert(
      fc.property(adhesive, course, within, (law, one, share) => {
        const middle = share * endMs(one);
        const whole = integrate(one, cureDoseLaw(law), 0, endMs(one));
        const parts =
          integrate(one, cureDoseLaw(law), 0, middle) + integrate(one, cureDoseLaw(law), middle, endMs(one));
        expect(Math.abs(parts - whole)).toBeLessThanOrEqual(1e-10 * whole);
      }),
      runs,
    );
  });

  test('solved for is gathered at the time found, and no earlier', () => {
    fc.assert(
      fc.property(adhesive, course, fc.double({ min: 0.01, max: 0.99, noNaN: true }), (law, one, share) => {
        const wanted = share * integrate(one, cureDoseLaw(law), 0, endMs(one));
        fc.pre(wanted > 0);
        const found = solve(one, cureDoseLaw(law), 0, wanted);
        if (found === null) throw new Error('not found');
        // The solver answers to within a millionth of a ms.
        const around = [found - 1e-5, found + 1e-5].map((ms) => integrate(one, cureDoseLaw(law), 0, ms));
        expect(around[0]).toBeLessThanOrEqual(wanted * (1 + 1e-12));
        expect(around[1]).toBeGreaterThanOrEqual(wanted * (1 - 1e-12));
      }),
      runs,
    );
  });

  test('is never solved for where the course does not gather it', () => {
    fc.assert(
      fc.property(adhesive, course, (law, one) => {
        const whole = integrate(one, cureDoseLaw(law), 0, endMs(one));
        expect(solve(one, cureDoseLaw(law), 0, whole * 1.000001 + 1e-9)).toBeNull();
      }),
      runs,
    );
  });

  test('is never slower hotter', () => {
    fc.assert(
      fc.property(adhesive, temperature, fc.double({ min: 0, max: 60, noNaN: true }), (law, temperatureC, moreC) => {
        const cooler = minutesToCure(law, temperatureC);
        const hotter = minutesToCure(law, temperatureC + moreC);
        expect(hotter === Infinity ? cooler : hotter).toBeLessThanOrEqual(cooler * (1 + 1e-12));
      }),
      runs,
    );
  });
});

const tenMs = 1_000_000_000_000;
const moment = (ms: number): Moment => ({ log: 'a', bench: tenMs + ms, wall: tenMs + ms });
const ovenEntry: fc.Arbitrary<OvenEntry> = fc
  .record({
    at: fc.integer({ min: -300 * minuteMs, max: 200 * minuteMs }).map(moment),
    told: fc.oneof(
      fc.record({
        kind: fc.constant('set' as const),
        setPointC: temperature,
        warmUpS: fc.option(fc.integer({ min: 0, max: 1800 })),
      }),
      fc.record({ kind: fc.constant('read' as const), temperatureC: temperature }),
      fc.record({ kind: fc.constant('door opened' as const) }),
      fc.record({ kind: fc.constant('power cut' as const) }),
    ),
  })
  .map(({ at, told }) => ({ at, ...told }));
const oven = fc.array(ovenEntry, { maxLength: 8 }).map((entries) => entries.sort((a, b) => a.at.bench - b.at.bench));

describe('a cure, whatever was entered of its oven', () => {
  test('never ends sooner than the maker’s time at the hottest temperature reached', () => {
    fc.assert(
      fc.property(adhesive, oven, temperature, (law, history, setPointC) => {
        const cure = cureOf({ from: moment(0), setPointC, adhesive: law, oven: history });
        fc.pre(cure.dueMs !== null);
        const dueMs = cure.dueMs ?? 0;
        expect(dueMs).toBeGreaterThanOrEqual(minutesToCure(law, cure.hottestC(dueMs)) * minuteMs * (1 - 1e-12) - 1e-3);
        expect(cure.doseAt(dueMs)).toBeGreaterThanOrEqual(1);
        expect(cure.overMs ?? Infinity).toBeGreaterThanOrEqual(dueMs);
      }),
      runs,
    );
  });

  test('has a coldest temperature that only falls once its dose counts', () => {
    fc.assert(
      fc.property(adhesive, oven, temperature, (law, history, setPointC) => {
        const cure = cureOf({ from: moment(0), setPointC, adhesive: law, oven: history });
        let coldest = Infinity;
        for (let minute = 0; minute <= 240; minute += 5) {
          const now = cure.coldestSinceCountingC(minute * minuteMs);
          if (cure.doseAt(minute * minuteMs) > 0) expect(now).not.toBeNull();
          if (now === null) continue;
          expect(now).toBeLessThanOrEqual(coldest);
          expect(now).toBeLessThanOrEqual(cure.temperatureAtC(minute * minuteMs) + 1e-9);
          coldest = now;
        }
      }),
      runs,
    );
  });

  test('does not depend on the order in which entries of one log are listed', () => {
    fc.assert(
      fc.property(
        adhesive,
        fc.uniqueArray(ovenEntry, { maxLength: 6, selector: (entry) => entry.at.bench }),
        (law, entries) => {
          // Older than a day is where a list is cut, so these lists stay younger.
          const once = cureOf({ from: moment(0), setPointC: 100, adhesive: law, oven: entries });
          const turned = cureOf({ from: moment(0), setPointC: 100, adhesive: law, oven: [...entries].reverse() });
          expect(turned.dueMs).toBe(once.dueMs);
          expect(turned.why).toEqual(once.why);
        },
      ),
      runs,
    );
  });
});

test('a segment stays between its ends', () => {
  fc.assert(
    fc.property(course, within, (one, share) => {
      for (const segment of one) {
        const ends = [segment.fromMs, segment.toMs].map((ms) => segmentTemperatureC(segment, ms));
        const temperatureC = segmentTemperatureC(segment, segment.fromMs + share * (segment.toMs - segment.fromMs));
        expect(temperatureC).toBeGreaterThanOrEqual(Math.min(...ends) - 1e-9);
        expect(temperatureC).toBeLessThanOrEqual(Math.max(...ends) + 1e-9);
      }
    }),
    runs,
  );
});
