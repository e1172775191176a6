import type { DefectLook, Finding } from '../../../src/core/endface/finding.ts';

/** Short ways to write a finding; distances are from the centre, so half of a zone's diameter. */
export const scratch = (sizeUm: number, fromCentreUm: number, count = 1): Finding => ({
  kind: 'scratch',
  looks: 'one line',
  sizeUm,
  fromCentreUm,
  count,
});
export const defect = (looks: DefectLook, sizeUm: number, fromCentreUm: number, count = 1): Finding => ({
  kind: 'defect',
  looks,
  sizeUm,
  fromCentreUm,
  count,
});
export const pit = (sizeUm: number, fromCentreUm: number, count = 1) => defect('pit', sizeUm, fromCentreUm, count);
export const chip = (sizeUm: number, fromCentreUm: number) => defect('chip', sizeUm, fromCentreUm);
export const crack = (fromCentreUm: number): Finding => ({ kind: 'crack', fromCentreUm, count: 1 });
export const dirt = (fromCentreUm: number): Finding => ({ kind: 'contamination', fromCentreUm, count: 1 });
export const noLight: Finding = { kind: 'no light', fromCentreUm: 0, count: 1 };
