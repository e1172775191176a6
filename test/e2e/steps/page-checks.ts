import AxeBuilder from '@axe-core/playwright';
import type { Page } from '@playwright/test';
import { cutTexts, overlappingLabels, smallTargets } from './page-measures.ts';

const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** Tablet on its side, tablet upright, the lead's phone. */
const sizes = [
  { width: 1280, height: 800 },
  { width: 800, height: 1280 },
  { width: 360, height: 740 },
];

/** One mistake often shows in many places. */
const most = 8;

/** What axe finds, with contrast 7:1 and the size of targets: "rule: element". */
async function axeFindings(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page })
    .options({ rules: { 'color-contrast-enhanced': { enabled: true }, 'target-size': { enabled: true } } })
    .withTags(tags)
    .setLegacyMode(true)
    .analyze();
  return violations.flatMap(({ id, nodes }) => nodes.map(({ target }) => `${id}: ${target.join(' ')}`));
}

/**
 * Everything that is wrong with what the page shows now: in both themes and at three sizes. Where gloves work, every
 * target must have 64 px.
 */
export async function findings(page: Page, name: string, worksWithGloves: boolean): Promise<string[]> {
  const found: string[] = [];
  const add = (where: string, some: readonly string[]) => {
    found.push(...some.slice(0, most).map((one) => `${name}, ${where}: ${one}`));
    if (some.length > most) found.push(`${name}, ${where}: and ${some.length - most} more`);
  };
  for (const theme of ['light', 'dark']) {
    await page.evaluate((chosen) => (document.documentElement.dataset['theme'] = chosen), theme);
    add(theme, await axeFindings(page));
  }
  for (const size of sizes) {
    await page.setViewportSize(size);
    // A layout that measures itself needs two frames.
    await page.evaluate(() => new Promise((drawn) => requestAnimationFrame(() => requestAnimationFrame(drawn))));
    const where = `${size.width}x${size.height}`;
    add(where, await page.evaluate(cutTexts));
    add(where, await page.evaluate(overlappingLabels));
    if (worksWithGloves) add(where, await page.evaluate(smallTargets, 64));
  }
  await page.setViewportSize({ width: 1280, height: 800 });
  return found;
}
