import type { Step } from '../core/recipe/schema.ts';

export type PictureKind = 'strip' | 'parts' | 'fill' | 'crimp' | 'cleave' | 'clean' | 'tray' | 'films' | 'end face';

/** Which drawing shows a step, or null where words alone do. */
export function pictureKind(step: Step): PictureKind | null {
  switch (step.kind) {
    case 'do':
      return step.picture === 'none' ? null : step.picture;
    case 'cure':
    case 'wait':
      return 'tray';
    case 'polish':
      return 'films';
    case 'inspect':
      return 'end face';
    case 'mix':
    case 'measure':
    case 'hold point':
      return null;
  }
}
