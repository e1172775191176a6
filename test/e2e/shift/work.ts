import type { Page } from '@playwright/test';
import * as batch from '../steps/batch.ts';
import { pass } from '../steps/page-clock.ts';

/** Work orders of the three batches. */
export const [upc, flat, apc] = ['WO 4480', 'WO 4481', 'WO 4482'] as const;

export const upTo = (last: number, first = 1): number[] =>
  Array.from({ length: last - first + 1 }, (_, index) => first + index);

/** Time passes while hands work; then somebody enters what they did. */
export async function work(page: Page, seconds: number, enter: () => Promise<void>): Promise<void> {
  await pass(page, seconds);
  await enter();
}

/** One by one, each after so many seconds. */
export async function each(
  page: Page,
  numbers: readonly number[],
  seconds: number,
  enter: (page: Page, number: number) => Promise<void>,
): Promise<void> {
  for (const number of numbers) await work(page, seconds, () => enter(page, number));
}

/** A polishing film, taken off 2 s before its aim: within its tolerance, and before it calls. */
export async function film(page: Page, count: number, aimS: number): Promise<void> {
  await batch.filmOn(page, count);
  await work(page, aimS - 2, () => batch.filmOff(page));
}

/** Three films of 60 s, each with the 2 s after it, then a look. */
export async function finerFilms(page: Page): Promise<void> {
  for (const aimS of [60, 60, 60]) {
    await film(page, 12, aimS);
    await pass(page, 2);
  }
  await batch.passAll(page, 12);
}

export const strip = (page: Page, number: number): Promise<void> => batch.finish(page, [number], 'stripped');
