import type { Recipe } from '../core/recipe/schema.ts';
import type { Words } from '../words/index.ts';

/** "2.5 mm, UPC, single-mode", "terminus, flat, 50/125": what a recipe makes, in a few words. */
export function kindWords({ fits }: Recipe, words: Words): string {
  const what = fits.terminus ? words.bench.terminus : words.bench.ferrule(fits.ferruleMm);
  const polish = words.common.polish(fits.polish, fits.angleDeg);
  const fibre =
    fits.fibreKind === 'single-mode'
      ? words.common.fibreKind('single-mode')
      : `${words.common.cores(fits.coresUm)}/${fits.claddingUm}`;
  return `${what}, ${polish}, ${fibre}`;
}
