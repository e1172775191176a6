import { expect, test, type BrowserContext, type Page } from '@playwright/test';
import { en } from '../../src/words/en.ts';
import * as prepare from './pages/prepare.ts';
import { planted } from './pages/prepare.ts';
import * as batch from './steps/batch.ts';
import { findings } from './steps/page-checks.ts';
import { installClock, pass } from './steps/page-clock.ts';
import { tap, tapChoice, toBench, toPage, type } from './steps/press.ts';
import { addOven, setUpShop } from './steps/settings.ts';

let context: BrowserContext;
let page: Page;
/** What must not happen on any page: a request elsewhere, a broken policy, an error. */
const happened: string[] = [];

test.beforeAll(async ({ browser, baseURL }) => {
  context = await browser.newContext({ viewport: { width: 1280, height: 800 }, hasTouch: true, timezoneId: 'UTC' });
  context.setDefaultTimeout(15_000);
  await installClock(context, Date.UTC(2026, 0, 15, 6, 10));
  const { origin } = new URL(baseURL ?? '');
  context.on('request', (request) => {
    const { protocol, origin: asked } = new URL(request.url());
    if (asked !== origin && !['data:', 'blob:'].includes(protocol)) happened.push(`a request to ${request.url()}`);
  });
  context.on('weberror', (error) => happened.push(error.error().message));
  await context.exposeFunction('policyBroken', (what: string) => happened.push(`the policy forbade ${what}`));
  await context.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) => {
      const { policyBroken } = window as unknown as { policyBroken(what: string): void };
      policyBroken(`${event.violatedDirective} ${event.blockedURI}`);
    });
  });
  page = await context.newPage();
  await page.goto('/');
});
test.afterAll(() => context.close());

/** Where gloves work, targets are large; elsewhere as large as axe asks for. */
async function look(name: string, where: 'gloves' | 'desk' = 'gloves', shown: Page = page): Promise<void> {
  expect.soft(await findings(shown, name, where === 'gloves')).toEqual([]);
}
/** What somebody typed stands there letter by letter, and nothing was made of it. */
async function expectAsTyped(text: string): Promise<void> {
  await expect(page.getByText(text).first()).toBeVisible();
  await expect(page.locator('img, i, svg[onload]')).toHaveCount(0);
  expect(await page.title()).not.toMatch(/^\d$/);
}
const cancel = () => tap(page, en.common.cancel);

test('every page: WCAG 2.2 AA and contrast 7:1 in both themes, targets, no text cut at three sizes, nothing from elsewhere', async () => {
  test.setTimeout(240_000);
  await test.step('bench without work, settings, start of a batch, ovens', async () => {
    await expect(page.getByRole('heading', { name: en.bench.empty.title })).toBeVisible();
    await look('empty bench');
    await toPage(page, 'settings');
    const shift = { name: 'Early', from: '06:00', to: '14:00' };
    await setUpShop(page, { tablet: 'Bench 2', operators: ['MK', 'JT'], shift });
    await look('settings', 'desk');

    await toPage(page, 'start');
    await tapChoice(page, en.newBatch.serials, en.newBatch.serialsPattern);
    await type(page, en.newBatch.connectors, '1001');
    await tap(page, /^Start/);
    await expect(page.getByText(en.newBatch.chooseRecipe)).toBeVisible();
    await look('start of a batch');

    await addOven(page, 'Oven 1', '100');
    await addOven(page, 'Heat block', '105');
    await look('ovens');
    await tap(page, en.ovens.action.add);
    await tap(page, en.ovens.sheet.confirmAdd);
    await look('oven to add');
    await cancel();
    await tap(page, en.ovens.action.read);
    await look('reading of an oven');
    await cancel();
  });

  await test.step('batch: strip, trouble, 1,000 connectors', async () => {
    await prepare.strips(page);
    await look('strip');
    await tap(page, 'Trouble with 4');
    await look('trouble');
    await tapChoice(page, en.batch.troubleSheet.finding, 'Strip length out of tolerance');
    await look('trouble, what now');
    await cancel();
    await prepare.thousand(page);
    await page.getByRole('button', { name: /^11 to 20/ }).tap();
    await look('1,000 connectors on hold');
    await expectAsTyped(planted.hold);
  });

  await test.step('batch: end faces', async () => {
    await prepare.faces(page);
    await look('inspect');
    await expectAsTyped(planted.workOrder);
    await batch.sendBack(page, 3, 'Deep single scratch', 'Polish on 1 µm diamond');
    await look('film to put on');
  });

  await test.step('batch: adhesive, cure, oven', async () => {
    await prepare.cures(page);
    await look('fill');
    await batch.showGroup(page, 'Cure', 12);
    await look('cure');
    await tap(page, new RegExp(`^${en.batch.oven.reading}`));
    await look('reading of a cure');
    await cancel();
    await tap(page, en.batch.main.trayOutEarly);
    await look('too early');
    await cancel();
    await tap(page, en.batch.trouble(''));
    await tap(page, en.batch.troubleSheet.secondMix);
    await look('mix');
    await expectAsTyped(planted.lot);
    await cancel();
  });

  await test.step('film, bench', async () => {
    await batch.goTo(page, planted.workOrder);
    await batch.filmOn(page, 1);
    await pass(page, 10);
    await look('film');
    await toBench(page);
    await look('bench');
    await expectAsTyped(planted.workOrder);
    await expectAsTyped(planted.hold);
  });

  await test.step('alarm, where you were, another window', async () => {
    await pass(page, 50);
    await look('alarm');
    await tap(page, en.alarm.seen);
    await page.reload();
    await look('where you were');
    await batch.goOn(page);
    await look('bench, over');
    const other = await context.newPage();
    await other.goto('/');
    await expect(other.getByRole('heading', { name: en.common.otherWindow.title })).toBeVisible();
    await look('another window', 'gloves', other);
    await other.close();
  });

  await test.step('recipes, shift, no such batch', async () => {
    await toPage(page, 'recipes');
    await look('recipes', 'desk');
    await page.getByRole('link', { name: /2.5 mm APC/ }).tap();
    await look('recipe', 'desk');
    await page.goto('/#/batch/unknown');
    await batch.goOn(page);
    await expect(page.getByRole('heading', { name: en.batch.notHere.title })).toBeVisible();
    await look('no such batch');
    await tap(page, en.common.back);
    await tap(page, /^Shift so far/);
    await expect(page.getByText(en.shift.byRecipe.title)).toBeVisible();
    await look('shift', 'desk');
    await expectAsTyped(planted.early);
  });

  expect(happened).toEqual([]);
});
