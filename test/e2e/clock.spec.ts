import { expect, test, type Page } from '@playwright/test';
import { en } from '../../src/words/en.ts';
import * as batch from './steps/batch.ts';
import { logLines } from './steps/log-lines.ts';
import { installClock, pass, setWall, sleep, wallNow } from './steps/page-clock.ts';
import { press, tap, toBench } from './steps/press.ts';

const upc = '2.5 mm UPC, single-mode, by machine';
const cureDone = 'Cure done. Take the tray out.';

test.use({ timezoneId: 'UTC', hasTouch: true });
test.beforeEach(async ({ page, context }) => {
  context.setDefaultTimeout(15_000);
  await installClock(context, Date.UTC(2026, 0, 15, 6, 10));
  await page.goto('/');
});

/** A batch of one, from the cable to the tray: its cure takes 20 min at the 100 °C of its recipe. */
async function intoTheOven(page: Page, workOrder: string): Promise<void> {
  await batch.openBatch(page, workOrder, 1, upc);
  await batch.finishAll(page, 1, 'checked');
  await batch.finishAll(page, 1, 'prepared');
  await batch.finish(page, [1], 'stripped');
  await batch.finishAll(page, 1, 'trimmed');
  await batch.finishAll(page, 1, 'cleaned');
  await batch.passOne(page, 1);
  await batch.mix(page, `lot of ${workOrder}`, '23', 60);
  await batch.finishAll(page, 1, 'filled');
  await batch.finishAll(page, 1, 'inserted');
  await batch.finishAll(page, 1, 'crimped');
  await tap(page, en.batch.main.trayIn(1));
  await press(page, new RegExp(`^${en.batch.oven.noneEntered}`));
}

/** Names of the entries since a number of lines. */
const entriesSince = async (page: Page, lines: number): Promise<string[]> =>
  (await logLines(page)).slice(lines).map((text) => (JSON.parse(text) as { type: string }).type);

test('a due cure flashes over any page; "Seen" quiets it and no other', async ({ page }) => {
  await intoTheOven(page, 'WO 1');
  await pass(page, 2);
  await intoTheOven(page, 'WO 2');
  await toBench(page);
  await pass(page, 1197);
  await expect(batch.flash(page)).toHaveCount(0);
  await pass(page, 1);
  await expect(batch.flash(page)).toContainText('WO 1');
  // The page lies beneath: the alarm covers all of it, and light flashes around its words.
  const covered = await batch.flash(page).evaluate((dialog) => {
    const { width, height } = dialog.getBoundingClientRect();
    const light = dialog.querySelector('[aria-hidden="true"]');
    const beats = light === null ? [] : light.getAnimations({ subtree: true });
    return { covers: width >= innerWidth && height >= innerHeight, flashes: beats.length > 0 };
  });
  expect(covered).toEqual({ covers: true, flashes: true });

  await pass(page, 3);
  await expect(batch.flash(page)).toContainText(en.alarm.others(1));
  await press(page, en.alarm.seen);
  await expect(batch.flash(page)).not.toContainText(en.alarm.others(1));
  await expect(batch.flash(page)).toContainText(cureDone);
  await press(page, en.alarm.seen);
  await expect(batch.flash(page)).toHaveCount(0);
  // Quiet, but still waiting for hands.
  await expect(page.getByRole('article').filter({ hasText: 'WO 1' })).toContainText(en.bench.sentence.cureDone);
  await expect(page.getByRole('article').filter({ hasText: 'WO 2' })).toContainText(en.bench.sentence.cureDone);
  await pass(page, 60);
  await expect(batch.flash(page)).toHaveCount(0);
});

test('an alarm that a sleeping page missed comes at once and says how late it is', async ({ page }) => {
  await intoTheOven(page, 'WO 1');
  const { length } = await logLines(page);
  await sleep(page, 1200 + 7 * 60);
  await expect(batch.flash(page)).toContainText(cureDone);
  await expect(batch.flash(page)).toContainText(en.alarm.late('7 min'));
  await press(page, en.alarm.seen);
  await batch.trayOut(page);
  expect(await entriesSince(page, length)).toEqual(['tabletWoke', 'clockSeen', 'loadEnded', 'loadStarted']);
  await toBench(page);
  await tap(page, /^Shift so far/);
  await expect(page.getByRole('listitem').filter({ hasText: 'Cure in the oven' })).toContainText(
    '7 min after it was due; alarm seen after 7 min',
  );
});

/**
 * The page goes away and comes back while only the wall clock goes on, as on tablets whose monotonic clock stands still
 * in sleep. In one go, since a page of a test never really freezes, and no tick may come between.
 */
const rest = (page: Page, how: 'frozen' | 'hidden', seconds: number): Promise<void> =>
  page.evaluate(
    ({ how, ms }) => {
      const say = (event: string, visibility: DocumentVisibilityState) => {
        Object.defineProperty(document, 'visibilityState', { configurable: true, get: () => visibility });
        document.dispatchEvent(new Event(event));
      };
      say('visibilitychange', 'hidden');
      if (how === 'frozen') say('freeze', 'hidden');
      window.testClock.setWall(Date.now() + ms);
      if (how === 'frozen') say('resume', 'hidden');
      say('visibilitychange', 'visible');
    },
    { how, ms: seconds * 1000 },
  );

for (const how of ['frozen', 'hidden'] as const) {
  test(`a sleep of a ${how} page counts by the wall clock, and an alarm in it is late`, async ({ page }) => {
    await intoTheOven(page, 'WO 1');
    const { length } = await logLines(page);
    await rest(page, how, 60);
    await expect.poll(() => batch.railTimes(page)).toEqual(['19:00']);
    await rest(page, how, 19 * 60 + 180);
    await batch.see(page, cureDone, 'WO 1', en.alarm.late('3 min'));
    await batch.goOn(page);
    expect(await entriesSince(page, length)).toEqual(['tabletWoke', 'tabletWoke', 'clockSeen']);
  });
}

test('a wall clock set back by an hour, with the page open, changes no time left', async ({ page }) => {
  await intoTheOven(page, 'WO 1');
  await pass(page, 300);
  expect(await batch.railTimes(page)).toEqual(['15:00']);
  const { length } = await logLines(page);
  await setWall(page, (await wallNow(page)) - 3_600_000);
  await expect.poll(() => entriesSince(page, length)).toEqual(['clockSet']);
  expect(await batch.railTimes(page)).toEqual(['15:00']);
  await expect(page.getByRole('banner')).toContainText('05:15');
  await pass(page, 60);
  expect(await batch.railTimes(page)).toEqual(['14:00']);
  await pass(page, 840);
  await batch.see(page, cureDone, 'WO 1');
});
