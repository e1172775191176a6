import { expect, type Page } from '@playwright/test';
import { en } from '../../../src/words/en.ts';
import * as batch from '../steps/batch.ts';
import { pass } from '../steps/page-clock.ts';
import { press } from '../steps/press.ts';
import { apc, each, flat, strip, upc, upTo, work } from './work.ts';

/** 0:00 to 43:00: UPC, from the cable to the oven; one wrong tap. */
export async function upcIntoTheOven(page: Page): Promise<void> {
  await batch.openBatch(page, upc, 12, '2.5 mm UPC, single-mode, by machine');
  await work(page, 120, () => batch.finishAll(page, 12, 'checked'));
  await work(page, 360, () => batch.finishAll(page, 12, 'prepared'));
  await work(page, 30, () => strip(page, 1));
  await strip(page, 2);
  await press(page, en.batch.undo('Strip 2'));
  await each(page, upTo(12, 2), 30, strip);
  await work(page, 120, () => batch.finishAll(page, 12, 'trimmed'));
  await work(page, 180, () => batch.finishAll(page, 12, 'cleaned'));
  await work(page, 180, () => batch.passAll(page, 12));
  await work(page, 180, () => batch.mix(page, 'A-2231', '23', 60));
  await work(page, 300, () => batch.finishAll(page, 12, 'filled'));
  await work(page, 480, () => batch.finishAll(page, 12, 'inserted'));
  await work(page, 240, () => batch.finishAll(page, 12, 'crimped'));
  await work(page, 60, () => batch.trayIn(page, 12, 'Oven 1'));
  expect(await batch.railTimes(page)).toEqual(['20:00']);
}

/** 43:00 to 61:00: flat, the same with what is left of the mix; a reload in the middle of the cure. */
export async function flatIntoTheOven(page: Page): Promise<void> {
  await batch.openBatch(page, flat, 6, '1.6 mm terminus, flat, multimode, by hand');
  await work(page, 60, () => batch.finishAll(page, 6, 'checked'));
  await work(page, 180, () => batch.finishAll(page, 6, 'prepared'));
  await each(page, upTo(6), 30, strip);
  await page.reload();
  await batch.goOn(page);
  // 63:00 - 50:00.
  expect(await batch.railTimes(page)).toEqual(['13:00']);
  await work(page, 60, () => batch.finishAll(page, 6, 'trimmed'));
  await work(page, 60, () => batch.finishAll(page, 6, 'cleaned'));
  await work(page, 60, () => batch.passAll(page, 6));
  // Mixed at 25:00 for 60 min; at 53:00 a touch less than 32 min.
  await batch.useMix(page, 'A-2231', '31 min');
  await work(page, 120, () => batch.finishAll(page, 6, 'filled'));
  await work(page, 180, () => batch.finishAll(page, 6, 'inserted'));
  await work(page, 120, () => batch.finishAll(page, 6, 'crimped'));
  await work(page, 60, () => batch.trayIn(page, 6, 'Oven 1'));
}

/** 61:00 to 79:00: APC, half of it into the oven; UPC out, and cool. */
export async function apcHalfIntoTheOven(page: Page): Promise<void> {
  await batch.openBatch(page, apc, 24, '2.5 mm APC 8°, single-mode, by machine');
  await work(page, 60, () => batch.finishAll(page, 24, 'checked'));
  await work(page, 60, () => batch.see(page, 'Cure done. Take the tray out.', upc));
  await batch.goTo(page, upc);
  await batch.trayOut(page);
  await batch.goTo(page, apc);
  await work(page, 240, () => batch.finishAll(page, 24, 'prepared'));
  await each(page, upTo(24), 12, strip);
  await work(page, 72, () => batch.see(page, 'Cool-down done', upc));
  await batch.goTo(page, upc);
  await batch.cooled(page);
  await batch.goTo(page, apc);
  await batch.finishAll(page, 24, 'trimmed');
  await batch.finishAll(page, 24, 'cleaned');
  await batch.passAll(page, 24);
  await work(page, 60, () => batch.mix(page, 'B-0117', '23', 60));
  await work(page, 60, () => batch.finish(page, upTo(12), 'filled'));
  await batch.showGroup(page, 'Insert', 12);
  await work(page, 120, () => batch.finishAll(page, 12, 'inserted'));
  await batch.showGroup(page, 'Crimp', 12);
  await work(page, 60, () => batch.finishAll(page, 12, 'crimped'));
  await batch.showGroup(page, 'Cure', 12);
  await work(page, 60, () => batch.trayIn(page, 12, 'Oven 1'));
}

/** 79:00 to 82:10: UPC to its first film, flat out; four clocks run at once. */
export async function fourClocksAtOnce(page: Page): Promise<void> {
  await batch.goTo(page, upc);
  await work(page, 60, () => batch.finishAll(page, 12, 'cleaved'));
  await work(page, 60, () => batch.see(page, 'Cure done. Take the tray out.', flat));
  await batch.goTo(page, flat);
  await batch.trayOut(page);
  await batch.goTo(page, upc);
  await work(page, 60, () => batch.finishAll(page, 12, 'taken down'));
  await batch.filmOn(page, 12);
  // Film 15 µm; working life 134:00 - 82:00; cool-down 91:00 - 82:00; cure 99:00 - 82:00.
  expect(await batch.railTimes(page)).toEqual(['0:30', '52:00', '9:00', '17:00']);
  await pass(page, 10);
  expect(await batch.railTimes(page)).toEqual(['0:20', '51:50', '8:50', '16:50']);
}

/** At 82:20, with the tablet just started again: the same clocks, and a reading that confirms the set point. */
export async function goOnAfterThePowerCut(page: Page): Promise<void> {
  await expect(page.getByRole('dialog')).toContainText(
    'Polish on 15 µm silicon carbide, 1 to 12; last entry 07:32, MK',
  );
  await batch.goOn(page);
  await batch.goTo(page, apc);
  expect(await batch.railTimes(page)).toEqual(['0:10', '51:40', '8:40', '16:40']);
  await batch.showGroup(page, 'Cure', 12);
  await batch.readOven(page, '100');
  expect(await batch.railTimes(page)).toEqual(['0:10', '51:40', '8:40', '16:40']);
}
