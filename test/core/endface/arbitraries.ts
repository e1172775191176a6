import fc from 'fast-check';
import type { CriterionSet, CriterionZone, SizeBands } from '../../../src/core/endface/criterion.ts';
import { defectLooks, scratchLooks, type Finding } from '../../../src/core/endface/finding.ts';
import { shippedSets } from '../../../src/core/endface/shipped-sets.ts';

/** Edges of sizes and zones are drawn often, since that is where a rule goes wrong. */
const sizeUm = fc.oneof(
  fc.constantFrom(1.99, 2, 2.01, 3, 3.01, 5, 5.01, 9.99, 10),
  fc.double({ min: 0.01, max: 60, noNaN: true }),
);
export const fromCentreUm = fc.oneof(
  fc.constantFrom(0, 12.5, 12.51, 32.5, 57.5, 57.51, 67.5, 125, 125.01),
  fc.double({ min: 0, max: 160, noNaN: true }),
);
const count = fc.oneof({ weight: 4, arbitrary: fc.constant(1) }, fc.integer({ min: 1, max: 7 }));

export const scratchFinding = fc.record({
  kind: fc.constant('scratch' as const),
  looks: fc.constantFrom(...scratchLooks),
  sizeUm,
  fromCentreUm,
  count,
});
const defectFinding = fc.record({
  kind: fc.constant('defect' as const),
  looks: fc.constantFrom(...defectLooks),
  sizeUm,
  fromCentreUm,
  count,
});
const bareFinding = fc.record({
  kind: fc.constantFrom('contamination' as const, 'crack' as const, 'no light' as const),
  fromCentreUm,
  count,
});

/** Cracks and dirt decide at once, so most findings are neither. */
export const finding: fc.Arbitrary<Finding> = fc.oneof(
  { weight: 6, arbitrary: scratchFinding },
  { weight: 6, arbitrary: defectFinding },
  { weight: 1, arbitrary: bareFinding },
);
export const findings = fc.array(finding, { maxLength: 8 });
export const cleanings = fc.integer({ min: 0, max: 4 });

/** Bands whose limits never rise with size, as every sound set has them. */
const bands: fc.Arbitrary<SizeBands> = fc
  .record({
    edges: fc.uniqueArray(fc.integer({ min: 1, max: 12 }), { maxLength: 3 }),
    including: fc.boolean(),
    mosts: fc.array(fc.option(fc.integer({ min: 0, max: 6 })), { minLength: 4, maxLength: 4 }),
  })
  .map(({ edges, including, mosts }) => {
    const falling = mosts.toSorted((a, b) => (b ?? Infinity) - (a ?? Infinity));
    const untils = [...edges.toSorted((a, b) => a - b).map((um) => ({ um, including })), null];
    return untils.map((until, index) => ({ until, most: falling[index] ?? null }));
  });

const shopSets: fc.Arbitrary<CriterionSet> = fc
  .array(fc.record({ widthUm: fc.integer({ min: 5, max: 80 }), scratches: bands, defects: bands }), {
    minLength: 1,
    maxLength: 4,
  })
  .map((rings) => {
    let innerDiameterUm = 0;
    const zones = rings.map(({ widthUm, ...rules }, index): CriterionZone => {
      const outerDiameterUm = innerDiameterUm + widthUm;
      const zone = { letter: 'ABCD'[index]!, part: 'core' as const, innerDiameterUm, outerDiameterUm, ...rules };
      innerDiameterUm = outerDiameterUm;
      return zone;
    });
    const basis = { rests: 'common practice, no source', confirmed: null } as const;
    return { id: 'drawn', name: 'Drawn', edition: '1', fibre: 'either', basis, zones, cleanings: { most: 2, basis } };
  });

export const anySet = fc.oneof(fc.constantFrom(...shippedSets), shopSets);
