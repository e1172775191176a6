import type { Basis } from '../unit/basis.ts';

/** Largest losses of components for a budget. Tables 6C1-IV and 6E1-IV are alike. */
export const componentLosses = {
  basis: {
    rests: 'published',
    source: 'MIL-STD-2042-6B, tables 6C1-IV and 6E1-IV',
  } satisfies Basis,
  /** Light-duty single terminus, heavy-duty multiple terminus and commercial connectors alike. */
  matedPairDb: 0.75,
  tunedSpliceDb: 0.2,
  untunedSpliceDb: 0.6,
  cableDbPerKm: {
    'single-mode': { 1300: 1.5, 1550: 1.5 },
    multimode: { 850: 4.5, 1300: 2 },
  },
} as const;

/** The windows of the tables, in nm. A source of 1310 nm belongs to the window of 1300. */
export type Light =
  | { readonly fibre: 'single-mode'; readonly windowNm: 1300 | 1550 }
  | { readonly fibre: 'multimode'; readonly windowNm: 850 | 1300 };

export function cableDbPerKm(light: Light): number {
  return light.fibre === 'single-mode'
    ? componentLosses.cableDbPerKm['single-mode'][light.windowNm]
    : componentLosses.cableDbPerKm.multimode[light.windowNm];
}
