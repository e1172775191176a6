import { expect, test } from '@playwright/test';
import { mkdtempSync } from 'node:fs';
import { serve } from '../../.ci/lib/serve.mjs';
import * as batch from './steps/batch.ts';
import { pass } from './steps/page-clock.ts';
import { addOven, setUpShop, waitUntilReadyOffline } from './steps/settings.ts';
import { build, cutPower, switchOn } from './steps/tablet.ts';

test('proto', async () => {
  const serving = await serve({ folder: build, port: 0 });
  const profile = mkdtempSync('/tmp/proto-');
  const tablet = await switchOn(profile, serving.address, Date.UTC(2026, 0, 15, 6, 10));
  const { page } = tablet;
  page.on('pageerror', (e) => console.log('pageerror', e.stack));
  page.on('console', (m) => ['error', 'warning'].includes(m.type()) && console.log('console', m.text()));
  const t0 = Date.now();
  const lap = (w: string) => console.log(w, Date.now() - t0);
  await waitUntilReadyOffline(page);
  lap('offline');
  await serving.close();
  await setUpShop(page, { tablet: 'Bench 2', operators: ['MK', 'JT'], shift: { name: 'Early', from: '06:00', to: '14:00' } });
  lap('shop');
  await page.screenshot({ path: '/tmp/shots/p-settings.png' });
  await addOven(page, 'Oven 1', '100');
  await page.screenshot({ path: '/tmp/shots/p-ovens.png' });
  lap('oven');
  const one = await batch.openBatch(page, 'WO 4480', 12, '2.5 mm UPC, single-mode, by machine');
  await page.screenshot({ path: '/tmp/shots/p-batch.png' });
  lap('open');
  await pass(page, 120);
  await batch.finishAll(page, 12, 'checked');
  lap('checked');
  await pass(page, 360);
  await batch.finishAll(page, 12, 'prepared');
  for (let n = 1; n <= 12; n += 1) {
    await pass(page, 30);
    await batch.finish(page, [n], 'stripped');
  }
  lap('stripped');
  await page.screenshot({ path: '/tmp/shots/p-stripped.png' });
  console.log(one);
  await cutPower(tablet, profile);
  lap('cut');
  const again = await switchOn(profile, serving.address, Date.UTC(2026, 0, 15, 6, 30));
  await again.page.waitForTimeout(1000);
  await again.page.screenshot({ path: '/tmp/shots/p-again.png' });
  await again.context.close();
});
