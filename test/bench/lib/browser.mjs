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
