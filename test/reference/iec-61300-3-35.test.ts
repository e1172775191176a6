import { describe, expect, test } from 'vitest';
import type { Finding } from '../../src/core/endface/finding.ts';
import { judgeFace } from '../../src/core/endface/judge-face.ts';
import { criterionSetNamed, shippedSets } from '../../src/core/endface/shipped-sets.ts';
import { pit, scratch } from '../core/endface/findings.ts';
import { valueOf } from '../core/optics/value-of.ts';

const pc45 = 'IEC 61300-3-35, single-mode PC, return loss 45 dB';
const apc = 'IEC 61300-3-35, single-mode APC';
const pc26 = 'IEC 61300-3-35, single-mode PC, return loss 26 dB';
const multimode = 'IEC 61300-3-35, multimode PC';
const named = (name: string) => {
  const set = criterionSetNamed(name);
  if (!set) throw new Error(`no set "${name}"`);
  return set;
};
const judge = (name: string, ...findings: Finding[]) => valueOf(judgeFace(named(name), findings));

type Row = readonly [name: string, what: string, findings: readonly Finding[], zone: string | null];
const pass = null;

/** IEC 61300-3-35 edition 2 (2015), tables 1 to 4: from memory, to be confirmed against the bought text. Diameters in µm. */
describe('IEC 61300-3-35 edition 2 (from memory), every edge of a zone and of a size', () => {
  test.each([pc45, apc, pc26, multimode])('%s is told as unconfirmed, with its edition', (name) => {
    expect(named(name).basis).toMatchObject({ rests: 'from memory', confirmed: null });
    expect(judge(name).criterion).toMatchObject({ unconfirmed: true, edition: 'edition 2 (2015)' });
  });

  test('edition 3 is not shipped: its counts are not known', () => {
    expect(shippedSets.filter(({ edition }) => edition.includes('3'))).toEqual(
      shippedSets.filter(({ id }) => id === 'nasa-workmanship'),
    );
  });

  test.each([
    [pc45, [25, 115, 135, 250]],
    [apc, [25, 115, 135, 250]],
    [pc26, [25, 115, 135, 250]],
    [multimode, [65, 115, 135, 250]],
  ])('%s: zones A to D end at %j', (name, diametersUm) => {
    expect(named(name).zones.map(({ letter }) => letter)).toEqual(['A', 'B', 'C', 'D']);
    expect(named(name).zones.map(({ outerDiameterUm }) => outerDiameterUm)).toEqual(diametersUm);
  });

  const rows: readonly Row[] = [
    // Table 1
    [pc45, 'any scratch on the core', [scratch(0.1, 5)], 'A'],
    [pc45, 'a scratch on the rim of the core, 25 µm across', [scratch(1, 12.5)], 'A'],
    [pc45, 'a scratch just outside the core', [scratch(1, 12.51)], pass],
    [pc45, 'any defect on the core', [pit(0.1, 0)], 'A'],
    [pc45, 'many scratches of 3 µm on the cladding', [scratch(3, 30, 500)], pass],
    [pc45, 'a scratch of 3.01 µm on the cladding', [scratch(3.01, 30)], 'B'],
    [pc45, 'many defects below 2 µm', [pit(1.99, 30, 500)], pass],
    [pc45, 'five defects from 2 to 5 µm', [pit(2, 30, 2), pit(5, 50, 3)], pass],
    [pc45, 'six defects from 2 to 5 µm', [pit(2, 30, 3), pit(5, 50, 3)], 'B'],
    [pc45, 'a defect of 5.01 µm', [pit(5.01, 30)], 'B'],
    [pc45, 'a defect on the cladding’s edge, 115 µm across', [pit(9, 57.5)], 'B'],
    [pc45, 'anything in the adhesive', [pit(500, 60, 9), scratch(50, 67.5)], pass],
    [pc45, 'many defects below 10 µm on the ferrule', [pit(9.99, 100, 500)], pass],
    [pc45, 'a defect of 10 µm on the ferrule', [pit(10, 100)], 'D'],
    [pc45, 'a defect of 10 µm at 250 µm across', [pit(10, 125)], 'D'],
    [pc45, 'a defect outside the contact zone', [pit(50, 125.01)], pass],
    [pc45, 'a wide scratch on the ferrule', [scratch(50, 100)], pass],
    // Table 2
    [apc, 'four scratches of 3 µm on the core', [scratch(3, 5, 4)], pass],
    [apc, 'five scratches on the core', [scratch(1, 5, 5)], 'A'],
    [apc, 'a scratch of 3.01 µm on the core', [scratch(3.01, 5)], 'A'],
    [apc, 'any defect on the core', [pit(0.1, 0)], 'A'],
    [apc, 'a wide scratch on the cladding', [scratch(20, 30, 50)], pass],
    [apc, 'a defect of 5.01 µm on the cladding', [pit(5.01, 30)], 'B'],
    // Table 3
    [pc26, 'two scratches of 3 µm on the core', [scratch(3, 5, 2)], pass],
    [pc26, 'three scratches on the core', [scratch(3, 5, 3)], 'A'],
    [pc26, 'two defects of 3 µm on the core', [pit(3, 5, 2)], pass],
    [pc26, 'three defects on the core', [pit(1, 5, 3)], 'A'],
    [pc26, 'a defect of 3.01 µm on the core', [pit(3.01, 5)], 'A'],
    [pc26, 'three scratches wider than 3 µm on the cladding', [scratch(4, 30, 3), scratch(3, 30, 90)], pass],
    [pc26, 'four scratches wider than 3 µm on the cladding', [scratch(4, 30, 4)], 'B'],
    // Table 4
    [multimode, 'many scratches of 3 µm on the core', [scratch(3, 30, 500)], pass],
    [multimode, 'a scratch of 3.01 µm on the core', [scratch(3.01, 32.5)], 'A'],
    [multimode, 'four defects of 5 µm on the core', [pit(5, 20, 4)], pass],
    [multimode, 'five defects on the core', [pit(1, 20, 5)], 'A'],
    [multimode, 'a defect of 5.01 µm on the core', [pit(5.01, 20)], 'A'],
    [multimode, 'many scratches of 5 µm on the cladding', [scratch(5, 32.51, 500)], pass],
    [multimode, 'a scratch of 5.01 µm on the cladding', [scratch(5.01, 40)], 'B'],
  ];
  test.each(rows)('%s: %s', (name, _what, findings, zone) => {
    const judged = judge(name, ...findings);
    expect(judged.verdict).toBe(zone === null ? 'pass' : 'fail');
    if (judged.verdict === 'fail') expect(judged.decided).toMatchObject({ rule: 'too many', zone });
  });
});
