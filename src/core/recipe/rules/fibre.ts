import { pointer, type Rule } from '../problem.ts';

/** Single-mode cores are about 9 µm, multimode ones 50 µm and more; between them lies a slip of the pen. */
const largestSingleModeCoreUm = 12;
const smallestMultimodeCoreUm = 40;
/** A wider bore lets the fibre sit off-centre: 1 µm is usual for single-mode, 3 µm for multimode (from memory). */
const mostClearanceUm = { 'single-mode': 2, multimode: 5 } as const;

/** A core belongs to its kind of fibre. */
export const coreRule: Rule = ({ fits: { coresUm, fibreKind } }) =>
  coresUm.flatMap((coreUm, index) => {
    const single = fibreKind === 'single-mode';
    if (single ? coreUm <= largestSingleModeCoreUm : coreUm >= smallestMultimodeCoreUm) return [];
    const expected = single ? `at most ${largestSingleModeCoreUm} µm` : `at least ${smallestMultimodeCoreUm} µm`;
    return [
      {
        path: pointer('fits', 'coresUm', index),
        code: 'core-kind',
        expected,
        found: `${coreUm} µm`,
        sentence: `A ${fibreKind} core is ${expected}, not ${coreUm} µm.`,
      },
    ];
  });

const largest = (numbers: readonly number[]) => numbers.reduce((most, number) => Math.max(most, number), 0);
const smallest = (numbers: readonly number[]) => numbers.reduce((least, number) => Math.min(least, number), Infinity);

/** From core to jacket each layer is wider than the one inside it; a coating may be the buffer. */
export const layerRule: Rule = ({ fits }) => {
  const layers = [
    { name: 'widest core', path: '/fits/coresUm', um: largest(fits.coresUm) },
    { name: 'cladding', path: '/fits/claddingUm', um: fits.claddingUm },
    { name: 'coating', path: '/fits/coatingUm', um: fits.coatingUm },
    { name: 'buffer', path: '/fits/bufferUm', um: fits.bufferUm },
    {
      name: 'narrowest jacket',
      path: '/fits/cableJacketsMm',
      um: Math.round(smallest(fits.cableJacketsMm) * 1e6) / 1000,
    },
  ];
  return layers.slice(1).flatMap((layer, index) => {
    const inner = layers[index];
    if (!inner || inner.um < layer.um || (layer.name === 'buffer' && inner.um === layer.um)) return [];
    return [
      {
        path: layer.path,
        code: 'layer-order',
        expected: `more than the ${inner.name}, ${inner.um} µm`,
        found: `${layer.um} µm`,
        sentence: `The ${layer.name} must be wider than the ${inner.name}: ${layer.um} µm is not over ${inner.um} µm.`,
      },
    ];
  });
};

/** The glass goes through the bore, and the bore holds it near the middle. */
export const boreRule: Rule = ({ fits: { boreMinUm, boreMaxUm, claddingUm, fibreKind } }) => {
  const widestUm = claddingUm + mostClearanceUm[fibreKind];
  if (boreMinUm > boreMaxUm) {
    return [
      {
        path: '/fits/boreMaxUm',
        code: 'bore-order',
        expected: `at least ${boreMinUm} µm`,
        found: `${boreMaxUm} µm`,
        sentence: `The widest bore, ${boreMaxUm} µm, is smaller than the narrowest, ${boreMinUm} µm.`,
      },
    ];
  }
  if (boreMinUm < claddingUm) {
    return [
      {
        path: '/fits/boreMinUm',
        code: 'bore-small',
        expected: `at least the cladding, ${claddingUm} µm`,
        found: `${boreMinUm} µm`,
        sentence: `Glass of ${claddingUm} µm does not go through a bore of ${boreMinUm} µm.`,
      },
    ];
  }
  if (boreMaxUm > widestUm) {
    return [
      {
        path: '/fits/boreMaxUm',
        code: 'bore-large',
        expected: `at most ${widestUm} µm`,
        found: `${boreMaxUm} µm`,
        sentence: `A bore of ${boreMaxUm} µm leaves ${fibreKind} glass of ${claddingUm} µm off-centre.`,
      },
    ];
  }
  return [];
};
