import { describe, expect, test } from 'vitest';
import { diagnoseFace, diagnoses, diagnosisOf } from '../../../src/core/endface/diagnose.ts';
import { polishingWays, type WayBack } from '../../../src/core/endface/diagnosis.ts';
import { defectLooks } from '../../../src/core/endface/finding.ts';
import { shipped, shippedFiles } from '../recipe/shipped.ts';
import { crack, defect, dirt, noLight, pit, scratch } from './findings.ts';

const recipes = shippedFiles.map((file) => shipped(file.replace('.json', '')));

describe('diagnoses', () => {
  test('each has its own code, a cause, an action and what it rests on', () => {
    expect(new Set(diagnoses.map(({ code }) => code)).size).toBe(diagnoses.length);
    for (const { texts, basis } of diagnoses) {
      expect(texts.en.usualCauses.length).toBeGreaterThan(0);
      expect(texts.en.action).not.toBe('');
      if ('source' in basis) expect(basis.source).not.toBe('');
    }
  });

  test('each is recorded as a defect that every recipe knows', () => {
    for (const recipe of recipes) {
      const known = recipe.defects.map(({ code }) => code);
      const unknown = diagnoses.filter(({ defect: code }) => code !== null && !known.includes(code));
      // The flat terminus has no geometry to measure.
      const measured = ['undercut', 'protrusion', 'radius', 'apex', 'angle'];
      expect(unknown.filter(({ defect: code }) => !measured.includes(code ?? ''))).toEqual([]);
    }
  });

  test('fits the step that the shipped recipes send back to', () => {
    const fitting: Partial<Record<WayBack, RegExp>> = {
      reterminate: /^prepare$/,
      'polish in air': /^air$/,
      clean: /^clean-face$/,
    };
    const ways = recipes.flatMap(({ steps }) =>
      steps.flatMap((step) => (step.id === 'inspect-face' ? step.sendsBack : [])),
    );
    expect(ways.length).toBeGreaterThan(40);
    for (const { defect: code, to } of ways) {
      const { back } = diagnosisOf(code)!;
      expect(to, code).toMatch(fitting[back] ?? /^film-/);
      expect(fitting[back] === undefined, code).toBe(to.startsWith('film-'));
    }
  });

  test('nobody knows an unknown code', () => {
    expect(diagnosisOf('rust')).toBeNull();
  });
});

describe('diagnoses of a face', () => {
  const codes = (...findings: Parameters<typeof diagnoseFace>[0]) => diagnoseFace(findings).map(({ code }) => code);

  test('what undoes most comes first, each once', () => {
    const findings = [dirt(3), scratch(1, 2), scratch(2, 30), pit(1, 20), crack(10)];
    expect(codes(...findings)).toEqual(['crack', 'pits', 'scratch', 'contamination']);
    expect(codes(...findings.toReversed())).toEqual(codes(...findings));
  });

  test('one line and many fine lines are told apart', () => {
    expect(codes({ kind: 'scratch', looks: 'fine lines', sizeUm: 1, fromCentreUm: 3, count: 20 })).toEqual([
      'fine-lines',
    ]);
  });

  test('every look of a defect but "other" has one', () => {
    for (const look of defectLooks) expect(codes(defect(look, 1, 1))).toHaveLength(look === 'other' ? 0 : 1);
    expect(codes(noLight)).toEqual(['broken-fibre']);
    expect(codes()).toEqual([]);
  });

  test('a crack and a dark core lead to no film', () => {
    for (const finding of [crack(0), noLight]) expect(polishingWays).not.toContain(diagnoseFace([finding])[0]?.back);
  });
});
