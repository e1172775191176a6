import type { Page } from '@playwright/test';
import { en } from '../../../src/words/en.ts';
import * as batch from '../steps/batch.ts';
import { pass, sleep } from '../steps/page-clock.ts';
import { apc, each, film, finerFilms, flat, strip, upc, upTo, work } from './work.ts';

const cureDone = 'Cure done. Take the tray out.';

/** 82:20 to 95:00: UPC to the end; the scratch on 5 is polished out. */
export async function upcToTheEnd(page: Page): Promise<void> {
  await batch.goTo(page, upc);
  await work(page, 8, () => batch.filmOff(page));
  await pass(page, 32);
  await finerFilms(page);
  await film(page, 12, 45);
  await work(page, 17, () => batch.finishAll(page, 12, 'cleaned'));
  await each(page, upTo(4), 10, batch.passOne);
  await work(page, 10, () => batch.sendBack(page, 5, 'Deep single scratch', 'Polish on 1 µm diamond'));
  await each(page, upTo(12, 6), 10, batch.passOne);
  await batch.showGroup(page, 'Measure', 11);
  await each(page, [...upTo(4), ...upTo(12, 6)], 10, batch.passOne);
  await work(page, 10, () => batch.see(page, 'Cool-down done', flat));
  await batch.goTo(page, flat);
  await batch.cooled(page);
  await batch.goTo(page, upc);
  await batch.showGroup(page, 'Release', 11);
  await work(page, 60, () => batch.finishAll(page, 11, 'capped and labelled'));
  await film(page, 1, 60);
  await work(page, 2, () => batch.passOne(page, 5));
  await film(page, 1, 45);
  await work(page, 17, () => batch.finish(page, [5], 'cleaned'));
  await work(page, 10, () => batch.passOne(page, 5));
  await work(page, 10, () => batch.passOne(page, 5));
  await work(page, 40, () => batch.finish(page, [5], 'capped and labelled'));
  await batch.closeBatch(page);
}

/** 95:00 to 105:00: flat; 2 is cracked, cut off, and begins anew. The first half of APC comes out. */
export async function flatFacesAndACrack(page: Page): Promise<void> {
  await batch.goTo(page, flat);
  await work(page, 60, () => batch.finishAll(page, 6, 'cleaved'));
  await work(page, 60, () => batch.finishAll(page, 6, 'taken down'));
  await work(page, 60, () => batch.finishAll(page, 6, 'polished'));
  await work(page, 60, () => batch.see(page, cureDone, apc));
  await batch.goTo(page, apc);
  await batch.showGroup(page, 'Cure', 12);
  await batch.trayOut(page);
  await batch.goTo(page, flat);
  await work(page, 60, () => batch.finishAll(page, 6, 'polished'));
  await work(page, 60, () => batch.passAll(page, 6));
  await work(page, 60, () => batch.finishAll(page, 6, 'polished'));
  await work(page, 60, () => batch.finishAll(page, 6, 'cleaned'));
  await work(page, 10, () => batch.passOne(page, 1));
  await work(page, 10, () => batch.cutOff(page, 2, 'Crack in the glass', 'Cut the cable, slide the parts on', 45));
  await each(page, upTo(6, 3), 10, batch.passOne);
  await batch.showGroup(page, 'Measure', 5);
  await each(page, [1, ...upTo(6, 3)], 10, batch.passOne);
  await batch.showGroup(page, 'Release', 5);
  await work(page, 10, () => batch.finishAll(page, 5, 'capped and labelled'));
}

/** 105:00 to 115:00: the other half of APC into the oven, and the cracked one after it. */
export async function secondOvenLoad(page: Page): Promise<void> {
  await batch.goTo(page, apc);
  await work(page, 60, () => batch.finishAll(page, 12, 'filled'));
  await work(page, 120, () => batch.finishAll(page, 12, 'inserted'));
  await work(page, 60, () => batch.see(page, 'Cool-down done', apc));
  await batch.cooled(page);
  await work(page, 60, () => batch.finishAll(page, 12, 'crimped'));
  await work(page, 60, () => batch.trayIn(page, 12, 'Oven 1'));
  await batch.goTo(page, flat);
  await work(page, 60, () => batch.finish(page, [2], 'prepared'));
  await work(page, 30, () => strip(page, 2));
  await work(page, 30, () => batch.finish(page, [2], 'trimmed'));
  await batch.finish(page, [2], 'cleaned');
  await batch.passOne(page, 2);
  // Mixed at 74:00 for 60 min; at 113:00 a touch less than 21 min.
  await batch.useMix(page, 'B-0117', '20 min');
  await work(page, 30, () => batch.finish(page, [2], 'filled'));
  await work(page, 30, () => batch.finish(page, [2], 'inserted'));
  await work(page, 30, () => batch.finish(page, [2], 'crimped'));
  await work(page, 30, () => batch.trayIn(page, 1, 'Oven 1'));
}

/** A cleaved load of APC to clean end faces: 6 min. */
async function apcFaces(page: Page): Promise<void> {
  await work(page, 60, () => batch.finishAll(page, 12, 'taken down'));
  await film(page, 12, 30);
  await pass(page, 32);
  await finerFilms(page);
  await film(page, 12, 60);
  await work(page, 2, () => batch.finishAll(page, 12, 'cleaned'));
}

/** 115:00 to 128:00: the first half of APC to the end; 7 is scrapped. */
export async function apcFirstHalfToTheEnd(page: Page): Promise<void> {
  await batch.goTo(page, apc);
  await work(page, 60, () => batch.finishAll(page, 12, 'cleaved'));
  await apcFaces(page);
  await each(page, upTo(6), 10, batch.passOne);
  await work(page, 10, () => batch.scrap(page, 7, 'Broken fibre, no light'));
  await each(page, upTo(12, 8), 10, batch.passOne);
  for (const _step of ['geometry', 'measure']) await each(page, [...upTo(6), ...upTo(12, 8)], 10, batch.passOne);
  await work(page, 20, () => batch.finishAll(page, 11, 'capped and labelled'));
}

/** 128:00 to 158:00: the tablet sleeps over the end of a cure; then APC to the end. */
export async function apcToTheEnd(page: Page): Promise<void> {
  await sleep(page, 300);
  // Due at 131:00, woken at 133:00.
  await batch.see(page, cureDone, apc, en.alarm.late('2 min'));
  await batch.trayOut(page);
  await work(page, 120, () => batch.see(page, cureDone, flat));
  await batch.goTo(page, flat);
  await batch.trayOut(page);
  await work(page, 480, () => batch.see(page, 'Cool-down done', apc));
  await batch.goTo(page, apc);
  await batch.cooled(page);
  await work(page, 60, () => batch.finishAll(page, 12, 'cleaved'));
  await work(page, 60, () => batch.see(page, 'Cool-down done', flat));
  await batch.goTo(page, flat);
  await batch.cooled(page);
  await batch.goTo(page, apc);
  await apcFaces(page);
  for (const _step of ['face', 'geometry', 'measure']) await each(page, upTo(24, 13), 10, batch.passOne);
  await work(page, 60, () => batch.finishAll(page, 12, 'capped and labelled'));
  await batch.closeBatch(page);
}

/** 158:00 to 174:00: a break; then the one that was begun anew. */
export async function flatToTheEnd(page: Page): Promise<void> {
  await batch.goTo(page, flat);
  await work(page, 720, () => batch.finish(page, [2], 'cleaved'));
  await work(page, 30, () => batch.finish(page, [2], 'taken down'));
  await work(page, 30, () => batch.finish(page, [2], 'polished'));
  await work(page, 30, () => batch.finish(page, [2], 'polished'));
  await work(page, 30, () => batch.passOne(page, 2));
  await work(page, 30, () => batch.finish(page, [2], 'polished'));
  await work(page, 30, () => batch.finish(page, [2], 'cleaned'));
  await work(page, 10, () => batch.passOne(page, 2));
  await work(page, 10, () => batch.passOne(page, 2));
  await work(page, 40, () => batch.finish(page, [2], 'capped and labelled'));
  await batch.closeBatch(page);
}
