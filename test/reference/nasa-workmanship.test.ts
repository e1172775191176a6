import { describe, expect, test } from 'vitest';
import { diagnosisOf } from '../../src/core/endface/diagnose.ts';
import { polishingWays } from '../../src/core/endface/diagnosis.ts';
import type { Finding } from '../../src/core/endface/finding.ts';
import { judgeFace } from '../../src/core/endface/judge-face.ts';
import { criterionSetNamed, shippedSets } from '../../src/core/endface/shipped-sets.ts';
import { chip, crack, defect, dirt, scratch } from '../core/endface/findings.ts';
import { valueOf } from '../core/optics/value-of.ts';

const set = criterionSetNamed('Clean; no crack, chip, pit, scratch or hackle')!;
const judge = (...findings: Finding[]) => valueOf(judgeFace(set, findings));

/** NASA workmanship pictures, section 10.03 (2002), which cite NASA-STD-8739.5 10.2.7. */
describe('NASA workmanship pictures, section 10.03: end face', () => {
  test('acceptable: clean and free from cracks, scratches, edge chips, hackles, pits', () => {
    expect(judge()).toMatchObject({ verdict: 'pass', criterion: { unconfirmed: false } });
    expect(set.basis.rests).toBe('published');
  });

  test.each([
    ['a scratch on the core', scratch(1, 2)],
    ['a scratch on the ferrule', scratch(1, 100)],
    ['an edge chip', chip(3, 60)],
    ['a hackle', defect('hackle', 10, 30)],
    ['a pit', defect('pit', 1, 40)],
    ['a fibre that is not concentric', defect('fibre off centre', 5, 62)],
    ['an uneven adhesive ring', defect('uneven ring', 8, 64)],
  ])('not acceptable: %s', (_name, finding) => {
    expect(judge(finding)).toMatchObject({ verdict: 'fail', mends: 'rework' });
  });

  test.each([
    ['core', 2],
    ['cladding', 50],
    ['ferrule', 100],
  ])('adhesive on the %s is rejected and may be mended by polishing again', (_part, fromCentreUm) => {
    expect(judge(defect('adhesive', 10, fromCentreUm))).toMatchObject({ verdict: 'fail', mends: 'rework' });
    expect(diagnosisOf('adhesive-on-face')).toMatchObject({ back: 'polish in air', basis: { rests: 'published' } });
  });

  test('not clean: clean and look again', () => {
    expect(judge(dirt(20)).verdict).toBe('clean and look again');
  });
});

describe('NASA workmanship pictures, section 10.03: assembly', () => {
  test.each([
    ['strength-member', 'reterminate'],
    ['boot-reversed', 'reterminate'],
    ['cable-not-axial', 'dress the cable'],
  ])('%s is a reason to send back: %s', (code, back) => {
    expect(diagnosisOf(code)).toMatchObject({ back, basis: { rests: 'published' } });
  });
});

describe('NASA-STD-8739.5A: a crack is reterminated or scrapped, never polished out', () => {
  test.each(shippedSets.map((each) => [each.name, each] as const))('%s', (_name, each) => {
    for (const fromCentreUm of [0, 40, 60, 100, 1000]) {
      const judged = valueOf(judgeFace(each, [crack(fromCentreUm)]));
      expect(judged).toMatchObject({ verdict: 'fail', mends: 'reterminate or scrap' });
    }
  });

  test('its diagnosis leads to no film', () => {
    expect(polishingWays).not.toContain(diagnosisOf('crack')?.back);
  });
});
