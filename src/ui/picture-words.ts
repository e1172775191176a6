import type { Recipe, Step } from '../core/recipe/schema.ts';

/** Words that the drawings of a step need, in the language of the page. Every `name` says what the drawing shows. */

type Length = Recipe['strip']['jacketOffMm'];
type PolishStep = Extract<Step, { kind: 'polish' }>;

export interface StripWords {
  readonly name: string;
  readonly jacketOff: (length: Length) => string;
  readonly strengthMember: (length: Length) => string;
  readonly bareGlass: (length: Length) => string;
  /** "Lengths to scale, diameters 2 times larger." */
  readonly scale: (exaggeration: number) => string;
}

export interface FilmsWords {
  readonly name: (step: PolishStep) => string;
  /** "9 µm". */
  readonly film: (um: number) => string;
  readonly material: (material: PolishStep['filmMaterial']) => string;
  readonly pad: (pad: PolishStep['pad']) => string;
  readonly force: (step: PolishStep) => string;
  readonly liquid: (liquid: PolishStep['liquid']) => string;
  /** "60 s ± 5", "20 figures of eight". */
  readonly until: (until: PolishStep['until']) => string;
}

export interface TrayWords {
  readonly name: (count: number, temperature: string) => string;
  readonly celsius: (temperatureC: number) => string;
  readonly lowest: string;
  readonly setPoint: string;
  readonly reading: string;
  readonly highest: string;
  /** "handle below". */
  readonly handling: string;
  readonly dose: (dose: number) => string;
  readonly cured: string;
  readonly longest: string;
}

export interface EndFaceWords {
  readonly name: string;
  readonly core: string;
  readonly cladding: string;
  readonly ferrule: string;
  /** "25 to 115 µm" across. */
  readonly size: (zone: { readonly innerDiameterUm: number; readonly outerDiameterUm: number }) => string;
}

export interface ConnectorWords {
  readonly name: Readonly<Record<'parts' | 'fill' | 'crimp' | 'cleave' | 'clean glass' | 'clean end face', string>>;
  readonly boot: string;
  readonly crimpSleeve: string;
  readonly body: string;
  readonly ferrule: (diameterMm: number) => string;
  readonly adhesive: string;
  readonly bead: string;
  readonly score: string;
  readonly wipe: string;
}

export interface PictureWords {
  readonly strip: StripWords;
  readonly films: FilmsWords;
  readonly tray: TrayWords;
  readonly endFace: EndFaceWords;
  readonly connector: ConnectorWords;
}
