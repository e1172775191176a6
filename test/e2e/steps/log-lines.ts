import { expect, type Page } from '@playwright/test';

/** Every line on the disk, in the order of its log, read past the app. */
export const logLines = (page: Page, database = 'lintfree'): Promise<string[]> =>
  page.evaluate(
    (name) =>
      new Promise<string[]>((resolve, reject) => {
        const opening = indexedDB.open(name);
        opening.onerror = () => reject(new Error(String(opening.error)));
        opening.onsuccess = () => {
          const lines = opening.result.transaction('lines').objectStore('lines').getAll();
          lines.onerror = () => reject(new Error(String(lines.error)));
          lines.onsuccess = () => {
            opening.result.close();
            resolve((lines.result as { text: string }[]).map(({ text }) => text));
          };
        };
      }),
    database,
  );

export const lineCount = (page: Page, database = 'lintfree'): Promise<number> =>
  page.evaluate(
    (name) =>
      new Promise<number>((resolve, reject) => {
        const opening = indexedDB.open(name);
        opening.onerror = () => reject(new Error(String(opening.error)));
        opening.onsuccess = () => {
          const count = opening.result.transaction('lines').objectStore('lines').count();
          count.onerror = () => reject(new Error(String(count.error)));
          count.onsuccess = () => {
            opening.result.close();
            resolve(count.result);
          };
        };
      }),
    database,
  );

/** Does something that must be refused: no line more, when all is quiet again. */
export async function writesNothing(page: Page, act: () => Promise<void>): Promise<void> {
  const before = await logLines(page);
  await act();
  // Long enough for a write that was wrongly begun.
  await page.waitForTimeout(200);
  expect(await logLines(page)).toEqual(before);
}
