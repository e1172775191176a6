import { expect, test, type Page } from '@playwright/test';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { serve, type Serving } from '../../.ci/lib/serve.mjs';
import * as oven from './shift/into-the-oven.ts';
import { reckoned } from './shift/reckoned.ts';
import * as end from './shift/to-the-end.ts';
import { logLines } from './steps/log-lines.ts';
import { wallNow } from './steps/page-clock.ts';
import { addOven, setUpShop, waitUntilReadyOffline } from './steps/settings.ts';
import { expectShiftPage } from './steps/shift-page.ts';
import { build, cutPower, switchOn, type Tablet } from './steps/tablet.ts';

/** 06:10 on a day of work; the tablet's zone is UTC. */
const morning = Date.UTC(2026, 0, 15, 6, 10);
const problems: string[] = [];
let profile: string;
let serving: Serving;
let tablet: Tablet;

test.beforeAll(async () => {
  profile = mkdtempSync(join(tmpdir(), 'lintfree-shift-'));
  serving = await serve({ folder: build, port: 0 });
});
test.afterAll(async () => {
  await tablet?.context.close();
  await serving.close();
  rmSync(profile, { recursive: true, force: true });
});

async function startTablet(wallMs: number): Promise<Page> {
  tablet = await switchOn(profile, serving.address, wallMs);
  tablet.page.on('pageerror', (error) => problems.push(error.message));
  return tablet.page;
}

test('a shift on one tablet: three batches, four clocks at once, without its server, through a reload and a power cut', async () => {
  test.setTimeout(300_000);
  let page = await startTablet(morning);
  await test.step('the server goes once the tablet is ready offline', async () => {
    await waitUntilReadyOffline(page);
    await serving.close();
    const shift = { name: 'Early', from: '06:00', to: '14:00' };
    await setUpShop(page, { tablet: 'Bench 2', operators: ['MK', 'JT'], shift });
    await addOven(page, 'Oven 1', '100');
  });

  await test.step('0:00 UPC into the oven', () => oven.upcIntoTheOven(page));
  await test.step('43:00 flat into the oven, a reload', () => oven.flatIntoTheOven(page));
  await test.step('61:00 half of APC into the oven', () => oven.apcHalfIntoTheOven(page));
  await test.step('79:00 four clocks at once', () => oven.fourClocksAtOnce(page));

  await test.step('82:10 the power is cut in the middle of a film; nothing acknowledged is lost', async () => {
    const acknowledged = await logLines(page);
    const cutAtMs = await wallNow(page);
    await cutPower(tablet, profile);
    page = await startTablet(cutAtMs + 10_000);
    expect((await logLines(page)).slice(0, acknowledged.length)).toEqual(acknowledged);
    await oven.goOnAfterThePowerCut(page);
  });

  await test.step('82:20 UPC to the end, a scratch', () => end.upcToTheEnd(page));
  await test.step('95:00 faces of flat, a crack', () => end.flatFacesAndACrack(page));
  await test.step('105:00 the second oven load', () => end.secondOvenLoad(page));
  await test.step('115:00 half of APC to the end, a scrap', () => end.apcFirstHalfToTheEnd(page));
  await test.step('128:00 a sleep, APC to the end', () => end.apcToTheEnd(page));
  await test.step('158:00 flat to the end', () => end.flatToTheEnd(page));

  await test.step('the shift page says what was reckoned by hand', () => expectShiftPage(page, reckoned));
  expect(problems).toEqual([]);
});
