import { enteredAt, type Entry, type EntryId } from '../event/entry.ts';
import type { FactType } from '../event/facts.ts';
import type { Moment } from '../unit/moment.ts';
import type { Trace } from './types.ts';

/** A trace that reads what its entry says when it is asked: copied, it would be the half of all that a fold makes. */
export class EntryTrace implements Trace {
  readonly source: Entry;
  readonly at: Moment;
  readonly step: number | null;
  readonly connectors: readonly number[];

  constructor(source: Entry, at: Moment, step: number | null, connectors: readonly number[]) {
    this.source = source;
    this.at = at;
    this.step = step;
    this.connectors = connectors;
  }

  get entry(): EntryId {
    return { log: this.source.log, seq: this.source.seq };
  }

  get type(): FactType {
    return this.source.type;
  }

  get entered(): Moment {
    return enteredAt(this.source);
  }

  get by(): string {
    return this.source.by;
  }

  get command(): string {
    return `${this.source.page} ${this.source.mono}`;
  }
}
