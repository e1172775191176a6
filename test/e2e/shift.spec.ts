import { expect, test, type Page } from '@playwright/test';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { serve, type Serving } from '../../.ci/lib/serve.mjs';
import { en } from '../../src/words/en.ts';
import * as batch from './steps/batch.ts';
import { goOn, resume } from './steps/batch.ts';
import { logLines } from './steps/log-lines.ts';
import { pass, sleep, wallNow } from './steps/page-clock.ts';
import { press } from './steps/press.ts';
import { addOven, setUpShop, waitUntilReadyOffline } from './steps/settings.ts';
import { expectShiftPage } from './steps/shift-page.ts';
import { build, cutPower, switchOn, type Tablet } from './steps/tablet.ts';

const upc = '2.5 mm UPC, single-mode, by machine';
const apc = '2.5 mm APC 8°, single-mode, by machine';
const flat = '1.6 mm terminus, flat, multimode, by hand';
/** 06:10 on a day of work; the tablet's zone is UTC. All times below count from here, as minutes:seconds. */
const morning = Date.UTC(2026, 0, 15, 6, 10);

const profile = mkdtempSync(join(tmpdir(), 'lintfree-shift-'));
let serving: Serving;
let tablet: Tablet;

test.beforeAll(async () => {
  serving = await serve({ folder: build, port: 0 });
});
test.afterAll(async () => {
  await tablet?.context.close();
  await serving.close();
  rmSync(profile, { recursive: true, force: true });
});

const numbers = (from: number, to: number) => Array.from({ length: to - from + 1 }, (_, index) => from + index);

/** Time passes, then somebody enters something. */
async function after(page: Page, seconds: number, enter: Promise<void> | (() => Promise<void>)): Promise<void> {
  await pass(page, seconds);
  await (typeof enter === 'function' ? enter() : enter);
}
