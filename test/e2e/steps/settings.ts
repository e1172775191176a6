import { expect, type Page } from '@playwright/test';
import { en } from '../../../src/words/en.ts';
import { choose, press, tap, toPage, type } from './press.ts';

const say = en.settings;

export interface Shop {
  readonly tablet: string;
  readonly operators: readonly string[];
  readonly shift: { readonly name: string; readonly from: string; readonly to: string };
}

/** Tablet, people, hours; then the first of them signs on. */
export async function setUpShop(page: Page, { tablet, operators, shift }: Shop): Promise<void> {
  await toPage(page, 'settings');
  await type(page, say.bench.tablet, tablet);
  for (const initials of operators) {
    await type(page, say.bench.initials, initials);
    await tap(page, say.bench.add);
  }
  await tap(page, say.bench.addShift);
  await type(page, say.bench.shiftName, shift.name);
  await type(page, say.bench.from, shift.from);
  await type(page, say.bench.to, shift.to);
  await press(page, new RegExp(`^${say.bench.save}`));
  await choose(page, say.signOn.operator, operators[0] ?? '');
  await choose(page, say.signOn.shift, shift.name);
  await press(page, say.signOn.confirm(`${operators[0]}, ${shift.name}`));
}

/** Everything is kept on the tablet: from now on the server may go. */
export async function waitUntilReadyOffline(page: Page): Promise<void> {
  await toPage(page, 'settings');
  await expect(page.getByText(say.offline.state['ready offline'])).toBeVisible();
}

export async function addOven(page: Page, name: string, setPointC: string): Promise<void> {
  await toPage(page, 'ovens');
  await tap(page, en.ovens.action.add);
  const sheet = page.getByRole('dialog', { name: en.ovens.sheet.add });
  await type(sheet, en.ovens.sheet.name, name);
  await type(sheet, en.ovens.sheet.setPoint, setPointC);
  await press(page, en.ovens.sheet.confirmAdd);
  await expect(page.getByRole('heading', { name, exact: true })).toBeVisible();
}
