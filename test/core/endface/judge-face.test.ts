import { describe, expect, test } from 'vitest';
import { judgeFace, type FaceVerdict } from '../../../src/core/endface/judge-face.ts';
import { criterionSetNamed, shippedSets } from '../../../src/core/endface/shipped-sets.ts';
import { setProblems } from '../../../src/core/endface/check-set.ts';
import { classOfSize, sizeClasses } from '../../../src/core/endface/size-classes.ts';
import { reachesBand } from '../../../src/core/endface/criterion.ts';
import { refusalOf, valueOf } from '../optics/value-of.ts';
import { shipped, shippedFiles } from '../recipe/shipped.ts';
import { crack, dirt, noLight, pit, scratch } from './findings.ts';

const pc45 = criterionSetNamed('IEC 61300-3-35, single-mode PC, return loss 45 dB')!;

describe('verdict of an end face', () => {
  test('a clean face passes, and says by which criterion', () => {
    expect(valueOf(judgeFace(pc45, []))).toEqual({
      verdict: 'pass',
      criterion: { id: pc45.id, name: pc45.name, edition: 'edition 2 (2015)', unconfirmed: true },
    });
  });

  test('a failure says zone, rule and count', () => {
    const judged = valueOf(judgeFace(pc45, [pit(3, 30, 4), pit(4, 40, 2)]));
    expect(judged).toMatchObject({
      verdict: 'fail',
      mends: 'rework',
      decided: { rule: 'too many', zone: 'B', kind: 'defect', from: { um: 2, including: true }, most: 5, count: 6 },
    });
  });

  test('the innermost zone decides, and in it the largest size', () => {
    const judged = valueOf(judgeFace(pc45, [pit(20, 100), pit(8, 30), pit(3, 30, 6), scratch(4, 30)]));
    const reasons = judged.verdict === 'fail' ? judged.reasons : [];
    expect(reasons).toMatchObject([
      { zone: 'B', kind: 'scratch', from: { um: 3, including: false } },
      { zone: 'B', kind: 'defect', from: { um: 5, including: false }, count: 1 },
      { zone: 'B', kind: 'defect', from: { um: 2, including: true }, count: 7 },
      { zone: 'D', kind: 'defect' },
    ]);
  });

  test('a crack comes before all', () => {
    const judged = valueOf(judgeFace(pc45, [pit(9, 0), dirt(0), noLight, crack(60)]));
    expect(judged).toMatchObject({
      mends: 'reterminate or scrap',
      decided: { rule: 'a crack is never polished out', zone: 'C', count: 1 },
    });
  });

  test('no light is cut off', () => {
    const judged = valueOf(judgeFace(pc45, [noLight]));
    expect(judged).toMatchObject({ mends: 'reterminate or scrap', decided: { rule: 'no light through the fibre' } });
  });
});

describe('contamination', () => {
  const after = (cleanings: number): FaceVerdict => valueOf(judgeFace(pc45, [dirt(20), dirt(200)], cleanings));

  test.each([
    [0, 3],
    [1, 2],
    [2, 1],
  ])('after %d cleanings: clean and look again, %d left (three: common practice, no source)', (cleanings, left) => {
    expect(after(cleanings)).toMatchObject({
      verdict: 'clean and look again',
      decided: { cleaningsLeft: left, count: 2, zone: 'B' },
    });
  });

  test('after the last cleaning it fails', () => {
    expect(after(3)).toMatchObject({ verdict: 'fail', mends: 'rework', decided: { rule: 'stays after cleaning' } });
  });

  test('does not hide a scratch', () => {
    expect(valueOf(judgeFace(pc45, [dirt(20), scratch(9, 0)])).verdict).toBe('fail');
  });
});

describe('refusals', () => {
  test.each([
    ['sizeUm', scratch(NaN, 0), 'not a number'],
    ['sizeUm', scratch(-1, 0), 'out of range'],
    ['sizeUm', scratch(0, 0), 'out of range'],
    ['sizeUm', pit(1e9, 0), 'out of range'],
    ['fromCentreUm', pit(1, -1), 'out of range'],
    ['fromCentreUm', crack(Infinity), 'not a number'],
    ['fromCentreUm', dirt(1e6), 'out of range'],
    ['count', pit(1, 0, 0), 'out of range'],
    ['count', pit(1, 0, 1.5), 'not whole'],
    ['count', pit(1, 0, NaN), 'not a number'],
  ])('%s of the second finding', (field, finding, code) => {
    expect(refusalOf(judgeFace(pc45, [pit(1, 40), finding]))).toMatchObject({
      code: 'finding unfit',
      refusal: { finding: 1, field, code },
    });
  });

  test.each([NaN, -1, 0.5, 101])('%d cleanings', (cleanings) => {
    expect(refusalOf(judgeFace(pc45, [], cleanings)).code).toBe('cleanings unfit');
  });

  test('more findings than anybody enters', () => {
    const findings = Array.from({ length: 1001 }, () => pit(1, 40));
    expect(refusalOf(judgeFace(pc45, findings))).toEqual({ code: 'too many findings', found: 1001, most: 1000 });
  });

  test('a set without zones judges nothing', () => {
    expect(refusalOf(judgeFace({ ...pc45, zones: [] }, []))).toMatchObject({ code: 'criterion unfit' });
  });
});

describe('shipped sets', () => {
  test.each(shippedSets.map((set) => [set.id, set] as const))('%s is sound', (_id, set) => {
    expect(setProblems(set)).toEqual([]);
    expect(set.cleanings.basis).toEqual({ rests: 'common practice, no source', confirmed: null });
  });

  test('every last look of a shipped recipe names one of them, of its own fibre', () => {
    for (const file of shippedFiles) {
      const recipe = shipped(file.replace('.json', ''));
      const looks = recipe.steps.flatMap((step) => (step.kind === 'inspect' ? [step.criterion] : []));
      const set = criterionSetNamed(looks.at(-1)!);
      expect(set, file).not.toBeNull();
      expect(['either', recipe.fits.fibreKind]).toContain(set!.fibre);
    }
  });

  test('words of a recipe’s own name no set', () => {
    expect(criterionSetNamed('Bare fibre whole, clean, without a nick')).toBeNull();
  });
});

describe('size classes', () => {
  test('are what the zones tell apart', () => {
    const classes = sizeClasses(pc45, 'defect');
    expect(classes.map(({ until }) => until)).toEqual([
      { um: 2, including: false },
      { um: 5, including: true },
      { um: 10, including: false },
      null,
    ]);
    expect(classes.map(({ standsForUm }) => standsForUm)).toEqual([1, 3.5, 7.5, 15]);
    expect(sizeClasses(pc45, 'scratch').map(({ standsForUm }) => standsForUm)).toEqual([1.5, 4.5]);
  });

  test.each(shippedSets.map((set) => [set.id, set] as const))(
    '%s: a class lies in one band of every zone',
    (_id, set) => {
      for (const kind of ['scratch', 'defect'] as const) {
        const classes = sizeClasses(set, kind);
        for (let sizeUm = 0.25; sizeUm < 20; sizeUm += 0.25) {
          const standsForUm = classOfSize(classes, sizeUm)!.standsForUm;
          for (const zone of set.zones) {
            const bands = kind === 'scratch' ? zone.scratches : zone.defects;
            const reached = (um: number) => bands.map((_band, index) => reachesBand(um, bands, index));
            expect(reached(standsForUm)).toEqual(reached(sizeUm));
          }
        }
      }
    },
  );
});
