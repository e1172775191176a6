import { expect, test } from '@playwright/test';
import { en } from '../../src/words/en.ts';
import { logLines } from './steps/log-lines.ts';
import { findings } from './steps/page-checks.ts';
import { installClock } from './steps/page-clock.ts';
import { tap, toBench, toPage } from './steps/press.ts';

test.use({ timezoneId: 'UTC', hasTouch: true });

test('a demo shift fills a bench of its own, is marked on every page, and goes without a trace', async ({
  page,
  context,
}) => {
  context.setDefaultTimeout(15_000);
  await installClock(context, Date.UTC(2026, 0, 15, 10, 42));
  await page.goto('/');
  await expect(page.getByRole('heading', { name: en.bench.empty.title })).toBeVisible();
  const own = await logLines(page);
  await tap(page, en.bench.empty.demo);

  const mark = page.getByRole('banner').getByText(en.common.demo, { exact: true });
  await expect(mark).toBeVisible();
  await expect(page.getByRole('article').nth(2)).toBeVisible();
  await test.step('what it shows is as good as any page', async () => {
    const away = page.getByRole('button', { name: en.bench.away.goOn });
    if (await away.isVisible()) await away.tap();
    const seen = page.getByRole('button', { name: en.alarm.seen });
    while (await seen.isVisible()) await seen.tap();
    expect.soft(await findings(page, 'demo bench', true)).toEqual([]);
  });
  for (const name of ['settings', 'ovens', 'start', 'recipes'] as const) {
    await toPage(page, name);
    await expect(mark).toBeVisible();
  }
  await toBench(page);
  await page.getByRole('article').first().getByRole('link').tap();
  await expect(page.getByRole('button', { name: /^Trouble/ })).toBeVisible();
  await expect(mark).toBeVisible();
  await toBench(page);
  await tap(page, /^Shift so far/);
  await expect(page.getByText(en.shift.byRecipe.title)).toBeVisible();
  await expect(mark).toBeVisible();
  expect.soft(await findings(page, 'demo shift', false)).toEqual([]);
  expect(await logLines(page)).toEqual(own);

  await toPage(page, 'settings');
  await tap(page, en.settings.demo.remove);
  await expect(mark).toHaveCount(0);
  await expect(page.getByRole('heading', { name: en.settings.title, exact: true })).toBeVisible();
  await toBench(page);
  await expect(page.getByRole('heading', { name: en.bench.empty.title })).toBeVisible();
  const names = await page.evaluate(async () => (await indexedDB.databases()).map(({ name }) => name));
  expect(names).toEqual(['lintfree']);
  expect((await logLines(page)).slice(0, own.length)).toEqual(own);
});
