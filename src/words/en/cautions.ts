import type { Caution } from '../../core/recipe/schema.ts';

interface CautionWords {
  readonly hazard: string;
  readonly text: string;
}

/** Shown where the hazard is. Each gives way to the site's own rules. */
export const cautions: Readonly<Record<Caution, CautionWords>> = {
  'bare glass': {
    hazard: 'Bare glass',
    text: 'Goggles on; every end into the marked sharps box. Site rules come first.',
  },
  solvent: {
    hazard: 'Solvent',
    text: 'Flammable. Keep it from oven and lamp, and let it dry. The safety sheet and site rules come first.',
  },
  adhesive: {
    hazard: 'Adhesive',
    text: 'Can cause allergy for life. Gloves as its safety sheet says; off the skin at once. Site rules come first.',
  },
  heat: { hazard: 'Hot tray', text: 'Use tongs or heat gloves until it has cooled. Site rules come first.' },
  'invisible light': {
    hazard: 'Invisible light',
    text: 'Never look into a fibre. Source off, or a filtered or camera scope. Site rules come first.',
  },
  dust: { hazard: 'Fine dust', text: 'Wipe up wet; do not blow it about. Site rules come first.' },
};
