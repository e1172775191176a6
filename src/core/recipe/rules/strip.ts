import { pointer, type Rule } from '../problem.ts';

/** A ferrule is at least this many times as long as it is across (common practice, no source). */
const ferruleLengthInDiameters = 4;

/** Without the noise of binary fractions, so that lengths compare and print as they were written. */
const rounded = (lengthMm: number) => Math.round(lengthMm * 1e6) / 1e6;

/** A tolerance is smaller than what it belongs to. */
export const stripToleranceRule: Rule = ({ strip }) =>
  Object.entries(strip).flatMap(([part, { nominalMm, toleranceMm }]) =>
    toleranceMm < nominalMm
      ? []
      : [
          {
            path: pointer('strip', part, 'toleranceMm'),
            code: 'strip-tolerance',
            expected: `less than ${nominalMm} mm`,
            found: `${toleranceMm} mm`,
            sentence: `A tolerance of ${toleranceMm} mm on ${nominalMm} mm could leave nothing.`,
          },
        ],
  );

/** Even at their longest, bare glass and strength member fit inside the shortest length of jacket taken off. */
export const stripNestingRule: Rule = ({ strip: { jacketOffMm, strengthMemberMm, bareGlassMm } }) => {
  const longestMm = (part: typeof bareGlassMm) => part.nominalMm + part.toleranceMm;
  const insideMm = rounded(longestMm(bareGlassMm) + longestMm(strengthMemberMm));
  const jacketMm = rounded(jacketOffMm.nominalMm - jacketOffMm.toleranceMm);
  if (insideMm <= jacketMm) return [];
  return [
    {
      path: '/strip/jacketOffMm',
      code: 'strip-nesting',
      expected: `at least ${insideMm} mm at its shortest`,
      found: `${jacketMm} mm`,
      sentence: `Bare glass and strength member take up to ${insideMm} mm, but only ${jacketMm} mm of jacket come off.`,
    },
  ];
};

/** Bare glass at its shortest reaches through the ferrule. */
export const stripReachRule: Rule = ({ strip: { bareGlassMm }, fits: { ferruleMm } }) => {
  const shortestMm = rounded(bareGlassMm.nominalMm - bareGlassMm.toleranceMm);
  const ferruleLongMm = ferruleMm * ferruleLengthInDiameters;
  if (shortestMm >= ferruleLongMm) return [];
  return [
    {
      path: '/strip/bareGlassMm',
      code: 'strip-reach',
      expected: `at least ${ferruleLongMm} mm at its shortest`,
      found: `${shortestMm} mm`,
      sentence: `${shortestMm} mm of bare glass do not reach through a ferrule of ${ferruleMm} mm.`,
    },
  ];
};

/** An attempt begun anew costs at least the cable that was stripped. */
export const reterminationRule: Rule = ({ retermination: { cableMm }, strip: { jacketOffMm } }) =>
  cableMm >= jacketOffMm.nominalMm
    ? []
    : [
        {
          path: '/retermination/cableMm',
          code: 'retermination-length',
          expected: `at least the jacket taken off, ${jacketOffMm.nominalMm} mm`,
          found: `${cableMm} mm`,
          sentence: `Cutting off costs at least the stripped ${jacketOffMm.nominalMm} mm of cable, not ${cableMm} mm.`,
        },
      ];
