import type { Page } from '@playwright/test';
import { en } from '../../../src/words/en.ts';
import * as batch from '../steps/batch.ts';
import { pass } from '../steps/page-clock.ts';
import { press, tap, type } from '../steps/press.ts';

/** Markup where a person may type: it must be shown as it was typed, and do nothing. */
export const planted = {
  workOrder: '<img src=x onerror="document.title=1"><b>WO</b> 4480 & Co',
  lot: '<script>document.title=2</script>A-2231',
  early: '<i>Lead agreed</i> &amp; signed',
  hold: '<svg onload="document.title=3"></svg>waits for film',
};

const workOrders = {
  strips: 'WO 4483',
  cures: 'WO 4484 of a customer whose work orders have long names, part 2 of 3',
  thousand: 'WO 4485',
  faces: planted.workOrder,
};
const upc = '2.5 mm UPC, single-mode, by machine';
const apc = '2.5 mm APC 8°, single-mode, by machine';

/** A step back with what a reason sheet asks for. */
export async function withReason(page: Page, label: string, reason: string): Promise<void> {
  await tap(page, label);
  await type(page, en.batch.reason.label, reason);
  await press(page, en.batch.reason.confirm);
}

async function throughTheMix(page: Page, count: number, lot: string): Promise<void> {
  await batch.finishAll(page, count, 'checked');
  await batch.finishAll(page, count, 'prepared');
  for (let one = 1; one <= count; one += 1) await batch.finish(page, [one], 'stripped');
  await batch.finishAll(page, count, 'trimmed');
  await batch.finishAll(page, count, 'cleaned');
  await batch.passAll(page, count);
  await batch.mix(page, lot, '23', 60);
}

async function intoTheOven(page: Page, count: number, oven: string): Promise<void> {
  await batch.finishAll(page, count, 'filled');
  await batch.finishAll(page, count, 'inserted');
  await batch.finishAll(page, count, 'crimped');
  await batch.trayIn(page, count, oven);
}

/** Two connectors at their end faces: one in inspection, one sent back to a film; taken out of the oven early. */
export async function faces(page: Page): Promise<void> {
  await batch.openBatch(page, workOrders.faces, 3, upc);
  await throughTheMix(page, 3, planted.lot);
  await intoTheOven(page, 3, 'Oven 1');
  await pass(page, 600);
  await withReason(page, en.batch.main.trayOutEarly, planted.early);
  await withReason(page, en.batch.main.endEarly, planted.early);
  await batch.finishAll(page, 3, 'cleaved');
  await batch.finishAll(page, 3, 'taken down');
  for (const aimS of [30, 60, 60, 60]) {
    await batch.filmOn(page, 3);
    await pass(page, aimS - 2);
    await batch.filmOff(page);
  }
  await batch.passAll(page, 3);
  await batch.filmOn(page, 3);
  await pass(page, 43);
  await batch.filmOff(page);
  await batch.finishAll(page, 3, 'cleaned');
  await batch.passOne(page, 1);
  await batch.scrap(page, 2, 'Crack in the glass');
}

/** 12 curing in an oven, 12 that still have to be filled. */
export async function cures(page: Page): Promise<void> {
  await batch.openBatch(page, workOrders.cures, 14, apc);
  await throughTheMix(page, 14, 'B-0117');
  await batch.finish(
    page,
    Array.from({ length: 12 }, (_, index) => index + 1),
    'filled',
  );
  await batch.showGroup(page, 'Insert', 12);
  await batch.finishAll(page, 12, 'inserted');
  await batch.showGroup(page, 'Crimp', 12);
  await batch.finishAll(page, 12, 'crimped');
  await batch.showGroup(page, 'Cure', 12);
  await batch.trayIn(page, 12, 'Heat block');
}

export async function strips(page: Page): Promise<void> {
  await batch.openBatch(page, workOrders.strips, 24, upc);
  await batch.finishAll(page, 24, 'checked');
  await batch.finishAll(page, 24, 'prepared');
  for (const one of [1, 2, 3]) await batch.finish(page, [one], 'stripped');
}

export async function thousand(page: Page): Promise<void> {
  await batch.openBatch(page, workOrders.thousand, 1000, apc);
  await batch.finishAll(page, 1000, 'checked');
  await tap(page, en.batch.trouble(''));
  await tap(page, en.batch.troubleSheet.hold);
  await type(page, en.batch.hold.label, planted.hold);
  await press(page, en.batch.hold.confirm);
}
