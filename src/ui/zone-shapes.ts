/** A zone of an end face between two diameters. */
export interface Zone {
  readonly id: string;
  /** As the criterion calls it: "A". */
  readonly letter: string;
  /** In the language of the page: "core". */
  readonly name: string;
  readonly innerDiameterUm: number;
  readonly outerDiameterUm: number;
}

/** A finding where it was tapped, from the centre of the core; y grows downwards. */
export interface FaceMark {
  readonly id: string;
  readonly kind: 'scratch' | 'defect' | 'dirt';
  readonly xUm: number;
  readonly yUm: number;
  readonly name: string;
}

export interface FaceScale {
  readonly sizePx: number;
  /** Diameter that is shown, with a margin of ferrule around the outermost zone. */
  readonly fieldUm: number;
}

export function scaleFor(zones: readonly Zone[], sizePx: number): FaceScale {
  const outermost = Math.max(1, ...zones.map(({ outerDiameterUm }) => outerDiameterUm));
  return { sizePx, fieldUm: outermost * 1.16 };
}

export const toPx = (um: number, { sizePx, fieldUm }: FaceScale): number => (um * sizePx) / fieldUm;

/** Where a point of the drawing lies on the end face. */
export function toUm(xPx: number, yPx: number, { sizePx, fieldUm }: FaceScale): { xUm: number; yUm: number } {
  const umPerPx = fieldUm / sizePx;
  return { xUm: (xPx - sizePx / 2) * umPerPx, yUm: (yPx - sizePx / 2) * umPerPx };
}

/** The zone of a point, or null outside the outermost; a border belongs to the inner zone, the stricter one. */
export function zoneAt(zones: readonly Zone[], xUm: number, yUm: number): Zone | null {
  const diameter = 2 * Math.hypot(xUm, yUm);
  const inside = zones.filter((zone) => diameter <= zone.outerDiameterUm);
  return inside.toSorted((a, b) => a.outerDiameterUm - b.outerDiameterUm)[0] ?? null;
}
