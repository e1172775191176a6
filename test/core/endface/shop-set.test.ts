import { describe, expect, test } from 'vitest';
import type { CriterionSet, CriterionZone } from '../../../src/core/endface/criterion.ts';
import { setProblems } from '../../../src/core/endface/check-set.ts';
import { judgeFace } from '../../../src/core/endface/judge-face.ts';
import { criterionSetNamed, shippedSets } from '../../../src/core/endface/shipped-sets.ts';
import { confirmSet, shopSet, type SetDraft } from '../../../src/core/endface/shop-set.ts';
import { refusalOf, valueOf } from '../optics/value-of.ts';
import { pit } from './findings.ts';

const by = { by: 'QA', at: { log: 'log', bench: 1000, wall: 1000 } };
const zone: CriterionZone = {
  letter: 'A',
  part: 'core',
  innerDiameterUm: 0,
  outerDiameterUm: 30,
  scratches: [{ until: null, most: 0 }],
  defects: [
    { until: { um: 2, including: false }, most: null },
    { until: null, most: 1 },
  ],
};
const draft: SetDraft = {
  id: 'our-own',
  name: 'Our own',
  edition: '1',
  fibre: 'single-mode',
  zones: [zone],
  mostCleanings: 2,
};

describe('a set of the shop’s own', () => {
  test('is answered for by a person and judges', () => {
    const set = valueOf(shopSet(draft, by));
    expect(set.basis).toEqual({ rests: 'set by the shop', confirmed: by });
    expect(valueOf(judgeFace(set, [pit(3, 0)]))).toMatchObject({ verdict: 'pass', criterion: { unconfirmed: false } });
    expect(valueOf(judgeFace(set, [pit(3, 0, 2)])).verdict).toBe('fail');
    expect(criterionSetNamed('Our own', [set])).toBe(set);
  });

  test('takes no id and no name that is taken', () => {
    const { id, name } = shippedSets[0]!;
    expect(refusalOf(shopSet({ ...draft, id }, by))).toEqual({ code: 'set exists', id });
    expect(refusalOf(shopSet({ ...draft, name }, by))).toEqual({ code: 'set exists', id });
    expect(refusalOf(shopSet(draft, by, [valueOf(shopSet(draft, by))]))).toMatchObject({ code: 'set exists' });
  });

  test('needs a name behind it', () => {
    expect(refusalOf(shopSet(draft, { ...by, by: ' ' }))).toEqual({ code: 'name missing' });
  });

  const withZone = (change: Partial<CriterionZone>): SetDraft => ({ ...draft, zones: [{ ...zone, ...change }] });
  test.each([
    ['id', { ...draft, id: 'Our Own' }, 'text unfit'],
    ['name', { ...draft, name: ' ' }, 'text unfit'],
    ['edition', { ...draft, edition: 'x'.repeat(121) }, 'text unfit'],
    ['cleanings', { ...draft, mostCleanings: NaN }, 'number unfit'],
    ['cleanings', { ...draft, mostCleanings: -1 }, 'number unfit'],
    ['zones', { ...draft, zones: [] }, 'no zones'],
    ['letter', withZone({ letter: '' }), 'text unfit'],
    ['letters', { ...draft, zones: [zone, { ...zone, innerDiameterUm: 30, outerDiameterUm: 40 }] }, 'letter twice'],
    ['a hole in the middle', withZone({ innerDiameterUm: 5 }), 'zones do not join'],
    ['no width', withZone({ outerDiameterUm: 0 }), 'zone without width'],
    ['a diameter', withZone({ outerDiameterUm: NaN }), 'number unfit'],
    ['a diameter', withZone({ outerDiameterUm: 1e9 }), 'number unfit'],
    ['no bands', withZone({ scratches: [] }), 'bands do not end open'],
    ['an end', withZone({ scratches: [{ until: { um: 3, including: true }, most: 0 }] }), 'bands do not end open'],
    [
      'order of sizes',
      withZone({
        defects: [
          { until: { um: 5, including: true }, most: 3 },
          { until: { um: 2, including: true }, most: 2 },
          { until: null, most: 0 },
        ],
      }),
      'bands do not rise',
    ],
    [
      'more of the larger',
      withZone({
        defects: [
          { until: { um: 5, including: true }, most: 3 },
          { until: null, most: null },
        ],
      }),
      'larger allowed more often',
    ],
    [
      'a size',
      withZone({
        defects: [
          { until: { um: NaN, including: true }, most: 3 },
          { until: null, most: 0 },
        ],
      }),
      'number unfit',
    ],
    ['a count', withZone({ defects: [{ until: null, most: 1.5 }] }), 'number unfit'],
  ] as const)('is refused for its %s', (_what, unfit, code) => {
    const refused = refusalOf(shopSet(unfit, by));
    expect(refused.code === 'set unfit' ? refused.problems.map((problem) => problem.code) : []).toContain(code);
  });
});

describe('confirming', () => {
  const memory = shippedSets[0]!;

  test('a set from memory is unconfirmed until somebody answers for it', () => {
    const confirmed = valueOf(confirmSet(memory, by));
    expect(confirmed.basis).toEqual({ ...memory.basis, confirmed: by });
    expect(confirmed.cleanings.basis).toMatchObject({ confirmed: by });
    expect(valueOf(judgeFace(confirmed, [])).criterion.unconfirmed).toBe(false);
    expect(valueOf(judgeFace(memory, [])).criterion.unconfirmed).toBe(true);
    expect(criterionSetNamed(memory.name, [confirmed])).toBe(confirmed);
  });

  test('needs a name; what was published needs nobody', () => {
    expect(refusalOf(confirmSet(memory, { ...by, by: '' }))).toEqual({ code: 'name missing' });
    const published = shippedSets.find(({ id }) => id === 'nasa-workmanship')!;
    expect(refusalOf(confirmSet(published, by))).toEqual({ code: 'nothing to confirm' });
  });

  test('rules stay as they were', () => {
    const rules = ({ zones, id, name, edition }: CriterionSet) => ({ zones, id, name, edition });
    expect(rules(valueOf(confirmSet(memory, by)))).toEqual(rules(memory));
    expect(setProblems(memory)).toEqual([]);
  });
});
