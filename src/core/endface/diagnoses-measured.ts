import type { Basis } from '../unit/basis.ts';
import type { Diagnosis, WayBack } from './diagnosis.ts';

const practice: Basis = { rests: 'common practice, no source', confirmed: null };
const published = (source: string): Basis => ({ rests: 'published', source });
const memory = (source: string): Basis => ({ rests: 'from memory', source, confirmed: null });
const plate = published('Takahashi, J. Lightwave Tech., 1997, abstract');

function row(
  code: string,
  defect: string | null,
  back: WayBack,
  looksLike: string,
  usualCauses: readonly string[],
  action: string,
  basis: Basis,
): Diagnosis {
  return { code, defect, back, basis, texts: { en: { looksLike, usualCauses, action } } };
}

/** What an instrument shows, or the assembly. */
export const measuredDiagnoses: readonly Diagnosis[] = [
  row(
    'undercut',
    'undercut',
    'fine film',
    'Fibre lower than the limit at this radius.',
    ['Too long on the silica film.', 'Pad too soft.'],
    'Shorter final film, harder pad.',
    practice,
  ),
  row(
    'protrusion',
    'protrusion',
    'fine film',
    'Fibre higher than the limit.',
    ['Last diamond film too short or worn.', 'Aluminium oxide on zirconia, which it does not cut.'],
    'More time on diamond.',
    published('trade magazine: aluminium oxide does not cut zirconia; the rest is common practice'),
  ),
  row(
    'radius-low',
    'radius',
    'middle film',
    'Radius of curvature below the limit.',
    ['Pad too soft.', 'Force too high.'],
    'Harder pad or less force.',
    plate,
  ),
  row(
    'radius-high',
    'radius',
    'middle film',
    'Radius of curvature above the limit.',
    ['Pad too hard.', 'Force too low.'],
    'Softer pad or more force.',
    plate,
  ),
  row(
    'apex',
    'apex',
    'coarse film',
    'Highest point of the dome beside the fibre.',
    ['Fixture worn.', 'Plug not seated.', 'Load not balanced.'],
    'Service or refit the fixture; polish again from the film that forms the dome.',
    practice,
  ),
  row(
    'angle',
    'angle',
    'coarse film',
    'Angle or key out of the limits.',
    ['Plug turned in the fixture.', 'Fixture’s angle worn.'],
    'Seat it again; check the fixture.',
    practice,
  ),
  row(
    'pistoning',
    null,
    'reterminate',
    'Fibre height drifts after heat, damp or cycling.',
    ['Under-cured adhesive.', 'Adhesive that softens too low.', 'Adhesive creeps, shrinks or peels.'],
    'Check the cure record and the adhesive lot; qualify again.',
    published('technical report on reliability of optical connectors; MRS Proceedings, abstract'),
  ),
  row(
    'high-loss',
    'high-loss',
    'clean',
    'Loss too high and the face is good.',
    ['Core off centre.', 'Wrong kind of fibre.', 'Micro-bend in the boot.', 'Tie too tight.'],
    'Reference again; clean, then turn it or mate another; check how the cable lies.',
    published('NASA-STD-8739.5A: over-tight ties cause micro-bends; the rest is common practice'),
  ),
  row(
    'low-return-loss',
    'low-return-loss',
    'clean',
    'Return loss too low and the face is good.',
    ['No contact: near 11 dB.', 'Open end: near 14.5 dB.', 'Debris.', 'Spring stuck.', 'Square face on angled face.'],
    'Clean; check fibre height, radius and the other half.',
    { rests: 'computed', source: 'Fresnel reflection at glass of index 1.45 to 1.5' },
  ),
  row(
    'negative-loss',
    null,
    'measure again',
    'More power with the cable than without.',
    ['Reference lead dirty or defective.'],
    'Clean or replace the reference lead, then reference again.',
    published('MIL-STD-2042-6B, methods 6C1 and 6E1'),
  ),
  row(
    'macro-bend',
    'high-loss',
    'dress the cable',
    'Loss higher at 1550 and 1625 nm than at 1310 nm.',
    ['Boot kinked.', 'Bent tighter than it may be.'],
    'Lay the cable anew.',
    memory('bend loss grows with wavelength'),
  ),
  row(
    'strength-member',
    'strength-member',
    'reterminate',
    'Aramid uneven, or the cable turns in the connector.',
    ['Bad crimp.'],
    'Cut off and begin anew.',
    published('NASA workmanship pictures, section 10.03'),
  ),
  row(
    'boot-reversed',
    'boot-reversed',
    'reterminate',
    'Boot the wrong way round.',
    ['Slid on the wrong way.'],
    'Remove and replace the connector.',
    published('NASA workmanship pictures, section 10.03'),
  ),
  row(
    'cable-not-axial',
    null,
    'dress the cable',
    'Cable not in line with the connector for the first 5 cm.',
    ['Strain relief bent or not in place.'],
    'Lay it straight; remove and replace the strain relief where it is damaged.',
    published('NASA workmanship pictures, section 10.03'),
  ),
];
