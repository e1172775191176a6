import { expect, test, type Locator, type Page } from '@playwright/test';
import { en } from '../../src/words/en.ts';
import * as batch from './steps/batch.ts';
import { logLines, writesNothing } from './steps/log-lines.ts';
import { installClock } from './steps/page-clock.ts';
import { button, press, tap, toPage, type } from './steps/press.ts';
import { addOven, setUpShop } from './steps/settings.ts';

const upc = '2.5 mm UPC, single-mode, by machine';

test.use({ timezoneId: 'UTC', hasTouch: true });
test.beforeEach(async ({ page, context }) => {
  context.setDefaultTimeout(15_000);
  await installClock(context, Date.UTC(2026, 0, 15, 6, 10));
  await page.goto('/');
});

const field = (page: Page | Locator, label: string): Locator => page.getByRole('textbox', { name: label, exact: true });

/** A sentence at the field, told to who hears the page; what was typed still stands there. */
async function expectSentence(at: Locator, sentence: RegExp, typed: string): Promise<void> {
  await expect(at).toHaveAttribute('aria-invalid', 'true');
  await expect(at).toHaveAccessibleDescription(sentence);
  await expect(at).toHaveValue(typed);
}

const sentence = /^[A-Z0-9“].*\.$/;

test('a batch of 0, of 1,001, of many, without a number: a sentence at the field, nothing written', async ({
  page,
}) => {
  await toPage(page, 'start');
  await type(page, en.newBatch.workOrder, 'WO 4480');
  await page
    .getByRole('radio', { name: new RegExp(upc) })
    .locator('xpath=ancestor::label')
    .tap();
  const count = field(page, en.newBatch.connectors);
  for (const [typed, says] of [
    ['0', /At least 1\b.*\./],
    ['1001', /At most 1000\b.*\./],
    ['-3', /At least 1\b.*\./],
    ['12.5', /Whole numbers only\./],
    ['twelve', /“twelve” is no number.*\./],
    ['', /number.*\./],
  ] as const) {
    await writesNothing(page, async () => {
      await count.fill(typed);
      await tap(page, /^Start/);
      await expectSentence(count, says, typed);
    });
  }
  await count.fill('1000');
  await press(page, /^Start 1000 on tag 1$/);
  await expect(page.getByRole('button', { name: /^991 to 1000/ })).toBeVisible();
});

test('a work order of 300 characters and an empty one are refused; markup is kept as typed', async ({ page }) => {
  await toPage(page, 'start');
  await page
    .getByRole('radio', { name: new RegExp(upc) })
    .locator('xpath=ancestor::label')
    .tap();
  const workOrder = field(page, en.newBatch.workOrder);
  const long = 'W'.repeat(300);
  for (const [typed, says] of [
    [long, /300 characters; at most 80/],
    ['   ', /Enter the work order\./],
  ] as const) {
    await writesNothing(page, async () => {
      await workOrder.fill(typed);
      await tap(page, /^Start/);
      await expectSentence(workOrder, says, typed);
    });
  }
  const markup = '<b onclick="alert(1)">WO</b> & <i>4480</i>';
  await workOrder.fill(markup);
  await press(page, /^Start 12 on tag 1$/);
  await expect(page.getByRole('banner')).toContainText(markup);
  expect(await page.title()).toContain(markup);
  expect((await logLines(page)).filter((line) => line.includes(JSON.stringify(markup)))).toHaveLength(1);
});

test('an oven at 1000 °C and two commas are refused at the field; "92,5" is 92.5', async ({ page }) => {
  await addOven(page, 'Oven 1', '100');
  await tap(page, en.ovens.action.read);
  const sheet = page.getByRole('dialog');
  const reading = field(sheet, en.ovens.sheet.reading);
  for (const [typed, says] of [
    ['1000', /1000 °C|At most/],
    ['9,2,5', /one comma or point/],
    ['1.000,5', /one comma or point/],
    ['92.55', /At most 1 decimal/],
    ['hot', /“hot” is no number of °C/],
    ['', /Enter a number in °C/],
  ] as const) {
    await writesNothing(page, async () => {
      await reading.fill(typed);
      await tap(page, en.ovens.sheet.confirmRead);
      await expectSentence(reading, says, typed);
    });
  }
  await reading.fill('92,5');
  await press(page, en.ovens.sheet.confirmRead);
  await expect(sheet).toHaveCount(0);
  await expect(page.getByText(en.ovens.read('92.5', '06:10'))).toBeVisible();
  const last = JSON.parse((await logLines(page)).at(-1) ?? '{}') as { type: string; data: { temperatureC: number } };
  expect([last.type, last.data.temperatureC]).toEqual(['ovenRead', 92.5]);
});

test('an oven set to 1000 °C, without a name, with a warm-up of days: a sentence at each', async ({ page }) => {
  await toPage(page, 'ovens');
  await tap(page, en.ovens.action.add);
  const sheet = page.getByRole('dialog');
  const { name, setPoint, warmUp, confirmAdd } = en.ovens.sheet;
  await writesNothing(page, async () => {
    await type(sheet, name, 'Oven 1');
    await type(sheet, setPoint, '1000');
    await tap(page, confirmAdd);
    await expectSentence(field(sheet, setPoint), /1000 °C.*0 to 250 °C\./, '1000');
    await type(sheet, setPoint, '100');
    await type(sheet, warmUp, '5000');
    await tap(page, confirmAdd);
    await expect(field(sheet, warmUp)).toHaveAttribute('aria-invalid', 'true');
    await type(sheet, warmUp, '');
    await type(sheet, name, '');
    await tap(page, confirmAdd);
    await expect(field(sheet, name)).toHaveAccessibleDescription(/name/);
  });
});

test('adhesive without a lot, a room of 90 °C: a sentence at the field, and nothing mixed', async ({ page }) => {
  await batch.openBatch(page, 'WO 1', 1, upc);
  await batch.finishAll(page, 1, 'checked');
  await batch.finishAll(page, 1, 'prepared');
  await batch.finish(page, [1], 'stripped');
  await batch.finishAll(page, 1, 'trimmed');
  await batch.finishAll(page, 1, 'cleaned');
  await batch.passOne(page, 1);
  await tap(page, en.batch.main.mix);
  const sheet = page.getByRole('dialog');
  const confirm = button(sheet, /^Mixed now/);
  const [lot, room] = [field(sheet, en.batch.mix.lot), field(sheet, en.batch.mix.room)];
  await writesNothing(page, async () => {
    await confirm.tap();
    await expectSentence(lot, sentence, '');
    await lot.fill('L'.repeat(300));
    await confirm.tap();
    await expectSentence(lot, /300 characters/, 'L'.repeat(300));
    await lot.fill('A-2231');
    await room.fill('90');
    await confirm.tap();
    await expectSentence(room, /At most 45/, '90');
    await room.fill('22,,5');
    await confirm.tap();
    await expectSentence(room, /one comma or point/, '22,,5');
  });
  await room.fill('22,5');
  await press(page, /^Mixed now/);
  await expect(sheet).toHaveCount(0);
});

test('settings: initials, hours and names that cannot be are refused, and nothing of the form is kept', async ({
  page,
}) => {
  await setUpShop(page, { tablet: 'Bench 2', operators: ['MK'], shift: { name: 'Early', from: '06:00', to: '14:00' } });
  const { initials, from, tablet, add, save } = en.settings.bench;
  await writesNothing(page, async () => {
    for (const typed of ['MK', 'M K', 'ABCDE', '1', '<b>']) {
      await type(page, initials, typed);
      await tap(page, add);
      await expectSentence(field(page, initials), sentence, typed);
    }
    await type(page, initials, '');
    await type(page, from, '25:00');
    await tap(page, new RegExp(`^${save}`));
    await expectSentence(field(page, from), /“25:00”/, '25:00');
    await type(page, from, '06:00');
    await type(page, tablet, 'T'.repeat(300));
    await tap(page, new RegExp(`^${save}`));
    await expectSentence(field(page, tablet), /300 characters/, 'T'.repeat(300));
  });
});

test('a stored line of an unknown version is told, kept as it is, and the rest opens', async ({ page }) => {
  await batch.openBatch(page, 'WO 1', 2, upc);
  await batch.finishAll(page, 2, 'checked');
  await batch.finishAll(page, 2, 'prepared');
  const changed = await page.evaluate(
    () =>
      new Promise<string>((resolve, reject) => {
        const opening = indexedDB.open('lintfree');
        opening.onsuccess = () => {
          const lines = opening.result.transaction('lines', 'readwrite').objectStore('lines');
          const reading = lines.getAll();
          reading.onsuccess = () => {
            const last = (reading.result as { text: string }[]).at(-1);
            if (last === undefined) return reject(new Error('no line'));
            last.text = last.text.replace('"v":1', '"v":99');
            lines.put(last).onsuccess = () => resolve(last.text);
            opening.result.close();
          };
        };
      }),
  );
  await page.reload();
  await batch.goOn(page);
  await expect(page.getByText(en.bench.unreadable(1))).toBeVisible();
  await expect(page.getByRole('heading', { name: 'Cut the cable, slide the parts on' })).toBeVisible();
  expect(await logLines(page)).toContain(changed);
});
