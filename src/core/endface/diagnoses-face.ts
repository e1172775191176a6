import type { Basis } from '../unit/basis.ts';
import type { Diagnosis, WayBack } from './diagnosis.ts';

const practice: Basis = { rests: 'common practice, no source', confirmed: null };
const published = (source: string): Basis => ({ rests: 'published', source });

function row(
  code: string,
  back: WayBack,
  looksLike: string,
  usualCauses: readonly string[],
  action: string,
  basis: Basis,
): Diagnosis {
  return { code, defect: code, back, basis, texts: { en: { looksLike, usualCauses, action } } };
}

/** What is seen on a face, under the microscope. */
export const faceDiagnoses: readonly Diagnosis[] = [
  row(
    'scratch',
    'fine film',
    'One line, in any direction.',
    ['Coarse grit carried over.', 'Dirty film or plug.'],
    'Clean plug, fixture and film; polish again from the 3 or 1 µm film.',
    practice,
  ),
  row(
    'fine-lines',
    'final film',
    'Many fine parallel lines.',
    ['Final film worn.', 'Final film too short or too light.'],
    'New final film, more time.',
    practice,
  ),
  row(
    'pits',
    'middle film',
    'Dark points in the glass.',
    ['Step after the coarse film too short: the broken layer is still there.'],
    'Longer on the 3 and 1 µm films.',
    practice,
  ),
  row(
    'chip',
    'coarse film',
    'A bite at the rim of the cladding.',
    ['Polish in air too hard.', 'Stub too long.', 'Cleave torn.'],
    'Lighter polish in air. May polish out at the outer rim if the criterion allows its size.',
    practice,
  ),
  row(
    'crack',
    'reterminate',
    'A line that keeps its place, dark in light from the far end.',
    ['Nick at strip.', 'Pull at cleave.', 'Stress from heat.'],
    'Cut off and begin anew, or scrap. Never polish a crack out.',
    published('NASA-STD-8739.5A, action; causes are common practice'),
  ),
  row(
    'hackle',
    'reterminate',
    'A rough, stepped zone.',
    ['Bad cleave.'],
    'Cut off and begin anew; a longer coarse film only where it is at the surface.',
    practice,
  ),
  row(
    'broken-fibre',
    'reterminate',
    'The core stays dark.',
    [
      'Fibre buckled in the body while it cooled from the cure.',
      'Fibre pulled at the ferrule by adhesive that expanded.',
      'Fibre damaged before.',
    ],
    'Look for strip damage, adhesive at the ferrule’s entry and free length; cool more slowly. Cut off and begin anew.',
    published('LeFevre et al., J. Lightwave Tech. 11(4), 1993, abstract'),
  ),
  row(
    'adhesive-on-face',
    'polish in air',
    'Amber film on the glass or the ferrule.',
    ['Bead not taken off.', 'Smeared.'],
    'Polish again from the step that takes the bead off.',
    published('NASA workmanship pictures, section 10.03: may be fixable by repolishing'),
  ),
  row(
    'adhesive-ring',
    'reterminate',
    'A thick ring, or a crescent.',
    ['Bore too large.', 'Fibre off centre.', 'Bubbles.'],
    'Check bore size and injection. Good where the criterion’s rule for the adhesive zone allows it.',
    published('NASA workmanship pictures, section 10.03: an even ring is asked for'),
  ),
  row(
    'void',
    'reterminate',
    'A black gap at the ring or in the core.',
    ['Air in the adhesive.', 'Filled too little.', 'Cured too fast.'],
    'Take the air out of the mix, inject slowly until a bead shows, heat more slowly.',
    published('NASA NEPP lessons: a fast cure leaves volatiles no time; the rest is common practice'),
  ),
  row(
    'contamination',
    'clean',
    'Moves or goes when the face is cleaned.',
    ['Handling.', 'No cap.', 'Wet residue.'],
    'Clean dry, then wet to dry, and look again; only so often as the criterion allows.',
    practice,
  ),
];
