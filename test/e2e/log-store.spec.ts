import { expect, test, type BrowserContext, type Page } from '@playwright/test';
import type * as LogStorePage from './log-store/page.ts';
import { servePage } from './log-store/serve.ts';

declare global {
  interface Window {
    page: typeof LogStorePage;
  }
}

let served: Awaited<ReturnType<typeof servePage>>;
test.beforeAll(async () => {
  served = await servePage();
});
test.afterAll(() => served.close());

async function openPage(context: BrowserContext): Promise<Page> {
  const page = await context.newPage();
  await page.goto(served.address);
  await page.waitForFunction(() => window.page !== undefined);
  return page;
}

for (const [suite, fewest] of [
  ['indexedDb', 20],
  ['browser', 6],
] as const) {
  test(`log store in a real browser: ${suite}`, async ({ context }) => {
    const page = await openPage(context);
    const outcomes = await page.evaluate((name) => window.page.suites[name](), suite);
    expect(outcomes.filter(({ error }) => error !== null)).toEqual([]);
    expect(outcomes.length).toBeGreaterThanOrEqual(fewest);
  });
}

test('two windows that write one log at once leave one unbroken chain, and lose no entry', async ({ context }) => {
  const [one, other] = [await openPage(context), await openPage(context)];
  const moved = await Promise.all([
    one.evaluate(() => window.page.race(60, 'one')),
    other.evaluate(() => window.page.race(60, 'other')),
  ]);
  expect(await one.evaluate(() => window.page.verified())).toEqual({ state: 'unbroken', count: 120, texts: 120 });
  expect(moved[0] + moved[1]).toBeGreaterThan(0);
});

test('a tablet without room says so in words, keeps the lines, and goes on with what fits', async ({ context }) => {
  const page = await openPage(context);
  await page.evaluate(() => window.page.keepWithin(2_000_000));
  const append = (bytes: number) => page.evaluate((many) => window.page.appendBytes(many), bytes);
  expect(await append(100_000)).toEqual({ said: 'saved', unsaved: 0, count: 1 });
  const full = { said: 'The tablet has no room left for entries.', unsaved: 50, count: 1 };
  expect(await append(5_000_000)).toEqual(full);
  expect(await append(5_000_000)).toEqual(full);
  expect(await append(100_000)).toEqual({ said: 'saved', unsaved: 50, count: 2 });
});

test('one window writes at a time; "use here" hands over, and takes from a window that is deaf', async ({
  context,
}) => {
  const [first, second, third] = [await openPage(context), await openPage(context), await openPage(context)];
  const told = (page: Page) => page.evaluate(() => window.page.toldWriter());
  await first.evaluate(() => window.page.startWriter(false));
  await second.evaluate(() => window.page.startWriter(false));
  expect([await told(first), await told(second)]).toEqual([['writing'], ['waiting']]);

  await second.evaluate(() => window.page.useHere());
  await expect.poll(() => told(second)).toEqual(['waiting', 'writing']);
  expect(await told(first)).toEqual(['writing', 'lost', 'let go']);

  await third.evaluate(() => window.page.startWriter(true));
  await third.evaluate(() => window.page.useHere());
  await expect.poll(() => told(third)).toEqual(['waiting', 'writing']);
  expect(await told(second)).toEqual(['waiting', 'writing', 'lost', 'let go']);

  await second.reload();
  await second.waitForFunction(() => window.page !== undefined);
  await second.evaluate(() => window.page.startWriter(false));
  expect(await told(second)).toEqual(['waiting']);
  await third.close();
  await expect.poll(() => told(second)).toEqual(['waiting', 'writing']);
});
