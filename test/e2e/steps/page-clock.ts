import type { BrowserContext, Page } from '@playwright/test';

interface PageClock {
  /** Lets both clocks run on, in steps that a page in view would notice as ordinary seconds, or in one leap. */
  pass(ms: number, stepMs: number): void;
  /** Sets the wall clock alone, as a person or a time server does. */
  setWall(wallMs: number): void;
}

declare global {
  interface Window {
    testClock: PageClock;
  }
}

/** Times of a page stand still until a test lets them pass, so that every duration in a test can be reckoned by hand. */
function standStill({ wallMs, key }: { wallMs: number; key: string }): void {
  let kept = wallMs;
  try {
    // A reload goes on from where the page was.
    kept = Number(sessionStorage.getItem(key) ?? wallMs);
  } catch {
    // A page without an origin keeps nothing.
  }
  let wall = kept;
  let mono = 1000;
  const RealDate = Date;
  const keep = (): void => {
    try {
      sessionStorage.setItem(key, String(wall));
    } catch {
      // As above.
    }
  };
  class StillDate extends RealDate {
    constructor(...parts: unknown[]) {
      // With nothing said, a date is now.
      super(...((parts.length === 0 ? [wall] : parts) as [number]));
    }
    static override now(): number {
      return wall;
    }
  }
  window.Date = StillDate as DateConstructor;
  performance.now = () => mono;
  // A second after whatever changed on the screen: no touch of a test is a drip.
  Object.defineProperty(Event.prototype, 'timeStamp', { get: () => mono + 1000 });
  const run = (ms: number): void => {
    wall += ms;
    mono += ms;
    keep();
  };
  // No two touches are at one moment.
  window.addEventListener('pointerdown', () => run(1), true);
  window.testClock = {
    pass(ms, stepMs) {
      for (let left = ms; left > 0; left -= stepMs) {
        run(Math.min(left, stepMs));
        // The page looks at its clocks at every tick and whenever it gets the focus; a test need not wait for a tick.
        window.dispatchEvent(new Event('focus'));
      }
    },
    setWall(next) {
      wall = next;
      keep();
    },
  };
}

const key = 'test-clock';

export async function installClock(target: BrowserContext | Page, wallMs: number): Promise<void> {
  await target.addInitScript(standStill, { wallMs, key });
}

/** Time passes with the page in view. Steps under 5 s are no gap to the page. */
export const pass = (page: Page, seconds: number): Promise<void> =>
  page.evaluate((ms) => window.testClock.pass(ms, 4000), seconds * 1000);

/** Time passes while nothing runs: one leap. */
export const sleep = (page: Page, seconds: number): Promise<void> =>
  page.evaluate((ms) => window.testClock.pass(ms, ms), seconds * 1000);

export const setWall = (page: Page, wallMs: number): Promise<void> =>
  page.evaluate((ms) => window.testClock.setWall(ms), wallMs);

export const wallNow = (page: Page): Promise<number> => page.evaluate(() => Date.now());
