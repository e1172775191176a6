import type { Recipe } from '../core/recipe/schema.ts';

type Length = Recipe['strip']['jacketOffMm'];

export interface StripSizes {
  readonly jacketOffMm: Length;
  readonly strengthMemberMm: Length;
  readonly bareGlassMm: Length;
  readonly jacketDiameterMm: number;
  readonly bufferDiameterUm: number;
  readonly claddingDiameterUm: number;
}

/** One measured length: from a to b on the page, with the band within which its free end may fall. */
export interface Measured {
  readonly from: number;
  readonly to: number;
  readonly band: { readonly from: number; readonly to: number };
}

export interface StripLayout {
  readonly pxPerMm: number;
  /** How much larger diameters are drawn than lengths. */
  readonly exaggeration: number;
  readonly jacketEdge: number;
  readonly bufferEdge: number;
  readonly strengthEdge: number;
  readonly tip: number;
  readonly jacketHeight: number;
  readonly bufferHeight: number;
  readonly glassHeight: number;
  readonly jacketOff: Measured;
  readonly strengthMember: Measured;
  readonly bareGlass: Measured;
}

/** A stripped cable end to scale: lengths fill the width, diameters are twice as large where they have room. */
export function layoutStrip(sizes: StripSizes, widthPx: number): StripLayout {
  const jacketEdge = Math.min(120, widthPx * 0.2);
  const tip = widthPx - 4;
  const pxPerMm = (tip - jacketEdge) / (sizes.jacketOffMm.nominalMm + sizes.jacketOffMm.toleranceMm);
  const exaggeration = Math.min(2, 90 / (pxPerMm * sizes.jacketDiameterMm));
  const pxAcrossPerMm = pxPerMm * exaggeration;
  const end = jacketEdge + sizes.jacketOffMm.nominalMm * pxPerMm;
  const bufferEdge = end - sizes.bareGlassMm.nominalMm * pxPerMm;
  const strengthEdge = jacketEdge + sizes.strengthMemberMm.nominalMm * pxPerMm;
  const around = (at: number, { toleranceMm }: Length): Measured['band'] => ({
    from: at - toleranceMm * pxPerMm,
    to: at + toleranceMm * pxPerMm,
  });
  return {
    pxPerMm,
    exaggeration,
    jacketEdge,
    bufferEdge,
    strengthEdge,
    tip: end,
    jacketHeight: sizes.jacketDiameterMm * pxAcrossPerMm,
    bufferHeight: (sizes.bufferDiameterUm / 1000) * pxAcrossPerMm,
    glassHeight: (sizes.claddingDiameterUm / 1000) * pxAcrossPerMm,
    jacketOff: { from: jacketEdge, to: end, band: around(jacketEdge, sizes.jacketOffMm) },
    strengthMember: { from: jacketEdge, to: strengthEdge, band: around(strengthEdge, sizes.strengthMemberMm) },
    bareGlass: { from: bufferEdge, to: end, band: around(bufferEdge, sizes.bareGlassMm) },
  };
}
