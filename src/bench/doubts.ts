import type { Entry, Line } from '../core/event/entry.ts';
import type { LogStore } from '../log/store.ts';

/** Lines of which nobody heard whether they were saved, and what they were made for. */
export interface Doubt {
  readonly asked: string;
  readonly lines: readonly Line[];
  readonly entries: readonly Entry[];
}

/** Every append in doubt since the last that was saved. All were made after the same line, so at most one is there. */
export class Doubts {
  #doubts: readonly Doubt[] = [];

  get lines(): readonly Line[] {
    return this.#doubts.flatMap(({ lines }) => lines);
  }

  add(doubt: Doubt): void {
    this.#doubts = [...this.#doubts, doubt];
  }

  clear(): void {
    this.#doubts = [];
  }

  /** The one that was saved after all; null where the store has none of them, or does not answer. */
  async saved(store: LogStore): Promise<Doubt | null> {
    for (const doubt of this.#doubts) {
      const [first] = doubt.lines;
      if (!first) continue;
      const after = { log: first.log, seq: first.seq - 1 };
      const there = await store.lines(after, doubt.lines.length).catch(() => []);
      if (doubt.lines.every(({ text }, index) => there[index]?.text === text)) return doubt;
    }
    return null;
  }
}
