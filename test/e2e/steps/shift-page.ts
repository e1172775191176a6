import { expect, type Locator, type Page } from '@playwright/test';
import { en } from '../../../src/words/en.ts';
import { tap, toBench } from './press.ts';

const say = en.shift;

/** What the shift page must say, as it is read there. */
export interface ShiftNumbers {
  readonly sentence: string;
  /** By heading: the number and what stands beneath it. */
  readonly figures: Readonly<Record<string, readonly (string | RegExp)[]>>;
  /** By recipe: passed, right first time, scrapped, in work, median cycle. */
  readonly recipes: Readonly<Record<string, readonly string[]>>;
  readonly cycleSentence: string;
  /** By part: the average. */
  readonly averages: Readonly<Record<string, string>>;
  /** By part: median, 90th percentile. */
  readonly cycle: Readonly<Record<string, readonly string[]>>;
  readonly clocks: string;
  /** One of them: its title, and how it ended. */
  readonly lateClock: readonly [title: RegExp, how: string];
  readonly sentBack: readonly string[];
  readonly scrapped: readonly string[];
  /** On the bench page. */
  readonly soFar: string;
}

export async function expectShiftPage(page: Page, numbers: ShiftNumbers): Promise<void> {
  await toBench(page);
  await tap(page, numbers.soFar);
  await expect(page.getByText(numbers.sentence, { exact: true })).toBeVisible();
  const part = (title: string) =>
    page.locator('section').filter({ has: page.getByRole('heading', { name: title, exact: true }) });
  const cells = (table: Locator, name: string) =>
    table
      .getByRole('row')
      .filter({ has: page.getByRole('rowheader', { name, exact: true }) })
      .getByRole('cell');

  for (const [name, texts] of Object.entries(numbers.figures)) {
    const figure = page.locator('.figure').filter({ has: page.getByRole('heading', { name, exact: true }) });
    await expect(figure.locator(':scope > p')).toHaveText(texts);
  }
  for (const [name, texts] of Object.entries(numbers.recipes)) {
    await expect(cells(part(say.byRecipe.title), name)).toHaveText(texts);
  }
  const cycle = part(say.cycle.title);
  await expect(cycle).toContainText(numbers.cycleSentence);
  const spread = page.getByRole('columnheader', { name: say.cycle.ninetieth });
  for (const [name, texts] of Object.entries(numbers.cycle)) {
    await expect(cells(cycle.getByRole('table').filter({ has: spread }), name)).toHaveText(texts);
  }
  for (const [name, text] of Object.entries(numbers.averages)) {
    await expect(cells(cycle.getByRole('table').filter({ hasNot: spread }), name)).toHaveText(text);
  }
  await expect(part(say.lateness.title)).toContainText(numbers.clocks);
  const [title, how] = numbers.lateClock;
  await expect(part(say.lateness.title).getByRole('listitem').filter({ hasText: title })).toContainText(how);
  await expect(part(say.causes.sentBack).getByRole('listitem')).toHaveText(numbers.sentBack);
  await expect(part(say.causes.scrapped).getByRole('listitem')).toHaveText(numbers.scrapped);
}
