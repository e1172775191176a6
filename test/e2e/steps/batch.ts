import { expect, type Locator, type Page } from '@playwright/test';
import { en } from '../../../src/words/en.ts';
import { numberList } from '../../../src/words/format.ts';
import { button, choose, press, tap, tapChoice, toBench, toPage, type } from './press.ts';

const say = en.batch;

/** Starts a batch from the bench; its page opens. */
export async function openBatch(page: Page, workOrder: string, connectors: number, recipe: string): Promise<void> {
  await toPage(page, 'start');
  await type(page, en.newBatch.workOrder, workOrder);
  await type(page, en.newBatch.connectors, String(connectors));
  await choose(page, en.newBatch.recipe, new RegExp(recipe));
  await press(page, new RegExp(`^Start ${connectors} on tag \\d+$`));
  await expect(page).toHaveURL(/#\/batch\//);
}

/** Goes to the page of a batch by its tag on the bench. */
export async function goTo(page: Page, workOrder: string): Promise<void> {
  await toBench(page);
  await page.getByRole('article').filter({ hasText: workOrder }).getByRole('link').tap();
  await expect(page.getByRole('button', { name: /^Trouble|^Open it again/ })).toBeVisible();
}

/** The whole group at once: "all 12 checked, next". */
export const finishAll = (page: Page, count: number, done: string): Promise<void> =>
  press(page, say.main.all(count, done));

/** A part of a group, or one: "1 to 12 filled, next". */
export const finish = (page: Page, numbers: readonly number[], done: string): Promise<void> =>
  press(page, say.main.some(numberList(numbers), done));

export const passAll = (page: Page, count: number): Promise<void> => press(page, say.main.passAll(count));
export const passOne = (page: Page, number: number): Promise<void> => press(page, say.main.pass(String(number)));

export async function mix(page: Page, lot: string, roomC: string, minutes: number): Promise<void> {
  await tap(page, say.main.mix);
  await type(page, say.mix.lot, lot);
  await type(page, say.mix.room, roomC);
  await press(page, say.mix.confirm(minutes));
}

export async function useMix(page: Page, lot: string, left: string): Promise<void> {
  await tap(page, say.main.mix);
  await press(page, say.mix.use(lot, left));
}

export async function trayIn(page: Page, count: number, oven: string): Promise<void> {
  await tap(page, say.main.trayIn(count));
  await press(page, new RegExp(`^${oven}`));
}

export const trayOut = (page: Page): Promise<void> => press(page, say.main.trayOut);
export const cooled = (page: Page): Promise<void> => press(page, say.main.endWait);
export const filmOn = (page: Page, count: number): Promise<void> => press(page, say.main.filmOn(count));
export const filmOff = (page: Page): Promise<void> => press(page, say.main.filmOff);

/** Types a reading on the number pad, as with gloves on. */
export async function readOven(page: Page, digits: string): Promise<void> {
  await tap(page, new RegExp(`^${say.oven.reading}`));
  const sheet = page.getByRole('dialog', { name: say.oven.reading });
  for (const digit of digits) await button(sheet, digit === '.' ? en.common.decimalPoint : digit).tap();
  await press(page, say.oven.confirmReading);
}

/** Opens the sheet for trouble with the connectors that the main action names, and says what was found. */
async function found(page: Page, number: number, finding: string): Promise<void> {
  await tap(page, say.trouble(String(number)));
  await tapChoice(page, say.troubleSheet.finding, finding);
}

export async function sendBack(page: Page, number: number, finding: string, step: string): Promise<void> {
  await found(page, number, finding);
  await press(page, new RegExp(`^${say.troubleSheet.sendBack(step)}`));
}

export async function cutOff(
  page: Page,
  number: number,
  finding: string,
  step: string,
  cableMm: number,
): Promise<void> {
  await found(page, number, finding);
  const label = say.troubleSheet.cutOff(step, cableMm).replace(/[()]/g, '\\$&');
  await press(page, new RegExp(`^${label}`));
}

export async function scrap(page: Page, number: number, finding: string): Promise<void> {
  await found(page, number, finding);
  await press(page, say.troubleSheet.scrap);
}

/** Turns to another group of the same batch: "Inspect (7)". */
export const showGroup = (page: Page, label: string, count: number): Promise<void> =>
  tap(page, say.groupButton(label, count));

export const closeBatch = (page: Page): Promise<void> => press(page, say.main.close);

/** The alarm over the page, whatever page that is. */
export const flash = (page: Page): Locator => page.getByRole('alertdialog');

/** Waits for an alarm, checks what it says, and quiets it. */
export async function see(page: Page, title: string, ...texts: string[]): Promise<void> {
  await expect(flash(page)).toContainText(title);
  for (const text of texts) await expect(flash(page)).toContainText(text);
  await press(page, en.alarm.seen);
}

/** What the rail of clocks shows, in its order: "0:30". */
export const railTimes = (page: Page): Promise<string[]> =>
  page.getByRole('navigation', { name: en.bench.railName }).locator('time').allInnerTexts();

/** After a restart the page first says where one was. */
export async function goOn(page: Page): Promise<void> {
  await tap(page, en.bench.away.goOn);
  await expect(page.getByRole('dialog')).toHaveCount(0);
}
