import type { Entry, EntryId } from '../event/entry.ts';
import type { FactOf, FactType } from '../event/facts.ts';
import type { Recipe } from '../recipe/schema.ts';
import type { Moment } from '../unit/moment.ts';

/** Where a connector is. Passed means past the last step. */
export type Stands =
  | { readonly at: 'step'; readonly step: number }
  | { readonly at: 'load'; readonly load: string; readonly step: number }
  | { readonly at: 'passed' }
  | { readonly at: 'scrapped'; readonly defect: string; readonly step: number };

/** What happened to one connector, in order; `at` is when it happened. */
export type Happening = { readonly at: Moment; readonly by: string; readonly entry: EntryId } & (
  | {
      readonly kind: 'finished';
      readonly step: number;
      readonly handsOnMs: number;
      readonly overrunS: number;
      /** Why it was finished after the working life was over; only where it was. */
      readonly overrunReason?: string;
    }
  | { readonly kind: 'loaded'; readonly step: number; readonly load: string; readonly handsOnMs: number }
  | {
      readonly kind: 'unloaded';
      readonly step: number;
      readonly load: string;
      readonly spanMs: number;
      readonly verdict: FactOf<'loadEnded'>['data']['verdict'];
      readonly handsOnMs: number;
    }
  | {
      readonly kind: 'judged';
      readonly step: number;
      readonly verdict: 'pass' | 'fail';
      readonly defect: string | null;
      readonly handsOnMs: number;
    }
  | {
      readonly kind: 'sent back';
      readonly from: number;
      readonly to: number;
      readonly defect: string;
      readonly attempt: 'same' | 'new';
    }
  | { readonly kind: 'scrapped'; readonly step: number; readonly defect: string }
);

export interface Connector {
  /** Position in the batch, from 1. */
  readonly number: number;
  readonly serial: string | null;
  readonly end: 'A' | 'B' | null;
  readonly fibre: number | null;
  /** From 1; rises when it is cut off and begun anew. */
  readonly attempt: number;
  /** How often it was sent back within this attempt. */
  readonly reworks: number;
  /** Since when it stands where it stands. */
  readonly since: Moment;
  readonly stands: Stands;
  /** The mix whose working life limits it, until the limited step is finished. */
  readonly mix: string | null;
  /** The last adhesive mix it saw. */
  readonly mixSeen: string | null;
  readonly history: readonly Happening[];
}

/** A set of connectors at one station from-to. Several batches may share the id of one oven load. */
export interface Load {
  readonly id: string;
  readonly step: number;
  readonly connectors: readonly number[];
  readonly station: string;
  readonly from: Moment;
  readonly ended:
    | null
    | ({ readonly at: Moment; readonly by: string } & Pick<
        FactOf<'loadEnded'>['data'],
        'verdict' | 'dose' | 'coldestC' | 'lateS' | 'reason'
      >);
}

/** An entry that did not fit when its turn came: it changed nothing and waits for a person. */
export interface Misfit {
  readonly entry: EntryId;
  readonly type: FactType | 'unknown';
  readonly why: string;
}

/** One line of what was done, newest last: for undo, for "where you were", for the record. */
export interface Trace {
  readonly entry: EntryId;
  readonly type: FactType;
  readonly at: Moment;
  readonly entered: Moment;
  readonly by: string;
  readonly connectors: readonly number[];
  readonly step: number | null;
  /** Entries made by one command share it, so that one undo takes them all. */
  readonly command: string;
}

export interface Batch {
  readonly id: string;
  readonly tag: number;
  readonly workOrder: string;
  readonly recipeHash: string;
  readonly recipe: Recipe;
  readonly opened: Moment;
  readonly openedBy: string;
  readonly connectors: readonly Connector[];
  readonly loads: readonly Load[];
  readonly held: { readonly reason: string; readonly since: Moment } | null;
  readonly closed: { readonly how: 'complete' | 'short'; readonly at: Moment } | null;
  /** Clocks that were seen, by clock id, with how late. */
  readonly seen: Readonly<Record<string, { readonly at: Moment; readonly lateS: number }>>;
  readonly traces: readonly Trace[];
  readonly misfits: readonly Misfit[];
}

export interface Mix {
  readonly id: string;
  readonly adhesive: string;
  readonly lot: string;
  readonly mixed: Moment;
  readonly by: string;
  readonly workingLifeS: number;
  readonly roomC: number | null;
}

/** What was set, read or happened at an oven, oldest first. */
export type OvenHappening = { readonly at: Moment; readonly entry: EntryId } & (
  | { readonly kind: 'set'; readonly setPointC: number; readonly warmUpS: number | null }
  | { readonly kind: 'read'; readonly temperatureC: number }
  | { readonly kind: 'door opened' }
  | { readonly kind: 'power cut' }
);

export interface Oven {
  readonly id: string;
  readonly name: string;
  readonly history: readonly OvenHappening[];
}

export interface TakenRecipe {
  readonly hash: string;
  readonly recipe: Recipe;
}

export interface BenchWide {
  readonly tablet: string;
  readonly operators: readonly string[];
  readonly shifts: readonly { readonly name: string; readonly from: string; readonly to: string }[];
  readonly onShift: { readonly operator: string; readonly shift: string; readonly since: Moment } | null;
  readonly recipes: Readonly<Record<string, TakenRecipe>>;
  readonly mixes: Readonly<Record<string, Mix>>;
  readonly ovens: Readonly<Record<string, Oven>>;
  /** When each person made their latest entry on each log: `${log} ${initials}`. */
  readonly lastEntryBy: Readonly<Record<string, Moment>>;
  /** The latest entry of each log. */
  readonly lastEntry: Readonly<Record<string, Moment>>;
  readonly seen: Batch['seen'];
  /** A start of the page whose wall clock was behind the last line: the gap is unknown until stated. */
  readonly unknownGap: { readonly since: Moment } | null;
  readonly misfits: readonly Misfit[];
}

/** All that a tablet knows: derived from the log, never stored as truth. */
export interface Bench {
  readonly wide: BenchWide;
  readonly batches: Readonly<Record<string, Batch>>;
  /** The entries behind each batch, in total order; under "bench" the bench-wide ones that are at hand. */
  readonly entries: Readonly<Record<string, readonly Entry[]>>;
}
