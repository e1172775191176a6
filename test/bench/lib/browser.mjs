import { chromium } from '@playwright/test';

/** Nothing of the browser's own may use the disk or the network in the middle of a measurement. */
const args = [
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-quic',
  '--disable-sync',
  '--no-first-run',
];

/**
 * A browser on a profile on the disk, as a tablet has it. A browser without one keeps its databases in memory.
 * @param {{ path: string, profile: string, serviceWorkers?: 'allow' | 'block' }} what
 */
export async function openBrowser({ path, profile, serviceWorkers = 'allow' }) {
  return chromium.launchPersistentContext(profile, {
    executablePath: path,
    headless: true,
    viewport: { width: 1280, height: 800 },
    serviceWorkers,
    args,
  });
}

/** The bench is usable once its first button can be pressed. */
export const usable = 'button.start';

/* The functions below run in the page. */

/** Before the page's own code: notes when what makes the page usable is there. @param {string} selector */
export function noteUsable(selector) {
  const watch = new MutationObserver(() => {
    if (document.querySelector(selector) === null) return;
    watch.disconnect();
    /** @type {any} */ (globalThis).usableAtMs = performance.now();
  });
  watch.observe(document, { childList: true, subtree: true });
}

/** Ms from the start of the navigation until then, on the page's own clock; nothing before. @returns {number | undefined} */
export const usableAtMs = () => /** @type {any} */ (globalThis).usableAtMs;
