import { expect, type Locator, type Page } from '@playwright/test';
import { en } from '../../../src/words/en.ts';
import { lineCount } from './log-lines.ts';

/** A button by what it says, the small line beneath included where it has one. */
export const button = (page: Page | Locator, name: string | RegExp): Locator =>
  page.getByRole('button', { name, exact: typeof name === 'string' }).and(page.locator(':visible'));

/** A finger on a button that only shows something else: a sheet, another page. */
export async function tap(page: Page, name: string | RegExp): Promise<void> {
  await button(page, name).first().tap();
}

/**
 * A finger on a button that enters something: over when the line is on the disk and the button no longer says
 * "saving".
 */
export async function press(page: Page, name: string | RegExp): Promise<void> {
  const before = await lineCount(page);
  await tap(page, name);
  await acknowledged(page, before);
}

export async function acknowledged(page: Page, linesBefore: number): Promise<void> {
  await expect
    .poll(() => lineCount(page), { message: 'no line was written', intervals: [5, 10, 20, 50] })
    .toBeGreaterThan(linesBefore);
  await expect(page.getByRole('button', { name: en.common.saving })).toHaveCount(0);
}

/** Types into the field of that name; what stood there goes. */
export const type = (page: Page | Locator, label: string, text: string): Promise<void> =>
  page.getByRole('textbox', { name: label, exact: true }).fill(text);

/** One of several, by what its label says. */
const choice = (page: Page, group: string, label: string | RegExp): Locator =>
  page.getByRole('group', { name: group }).getByRole('radio', { name: label }).first();

/** A finger on a choice; where it leads on at once, the choice itself is gone then. */
export const tapChoice = (page: Page, group: string, label: string | RegExp): Promise<void> =>
  choice(page, group, label).locator('xpath=ancestor::label').tap();

export async function choose(page: Page, group: string, label: string | RegExp): Promise<void> {
  await tapChoice(page, group, label);
  await expect(choice(page, group, label)).toBeChecked();
}

const back = (page: Page): Locator => page.getByRole('banner').getByRole('link', { name: en.common.back });

/** Back to the bench, from any page, by the bar at the top. */
export async function toBench(page: Page): Promise<void> {
  if (await back(page).isVisible()) await back(page).tap();
  await expect(page.getByRole('button', { name: en.bench.settings, exact: true })).toBeVisible();
}

/** To one of the pages that the bench leads to. */
export async function toPage(page: Page, name: 'settings' | 'ovens' | 'start' | 'recipes'): Promise<void> {
  await toBench(page);
  await tap(page, en.bench[name]);
  await expect(back(page)).toBeVisible();
}
