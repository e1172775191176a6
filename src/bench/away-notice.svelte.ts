/** From this long out of sight on, the page says where one was before any action, in ms. */
export const awayMs = 120_000;

/** Whether the page must first say where one was: after a restart with open work, or after two minutes out of sight. */
export class AwayNotice {
  shown = $state(false);
  #hiddenSinceMs: number | null = null;

  constructor(document: Document = globalThis.document, now: () => number = () => Date.now()) {
    document.addEventListener('visibilitychange', () => {
      if (document.visibilityState === 'hidden') this.#hiddenSinceMs = now();
      else if (this.#hiddenSinceMs !== null && now() - this.#hiddenSinceMs >= awayMs) this.shown = true;
    });
  }

  started(openWork: boolean): void {
    this.shown = openWork;
  }

  goOn(): void {
    this.shown = false;
  }
}
