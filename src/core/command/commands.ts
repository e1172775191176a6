import type { EntryId } from '../event/entry.ts';
import type { FactOf } from '../event/facts.ts';

/** Entered later than it happened: how long ago in seconds, and why where that is more than two minutes. */
export interface Late {
  readonly agoS: number;
  readonly reason: string;
}

interface OnBatch {
  readonly batch: string;
  readonly late?: Late;
}

interface OnConnectors extends OnBatch {
  readonly connectors: readonly number[];
}

export type NamedConnector = FactOf<'batchOpened'>['data']['connectors'][number];

/** What a person can ask for. New ids are made at the edge and come with the command, since chance is not pure. */
export type Command =
  | {
      readonly type: 'open batch';
      readonly batch: string;
      /** Null takes the first free tag. */
      readonly tag: number | null;
      readonly workOrder: string;
      readonly recipeText: string;
      readonly connectors: readonly NamedConnector[];
    }
  | ({ readonly type: 'finish step'; readonly step: string; readonly overrunReason?: string } & OnConnectors)
  | ({
      readonly type: 'mix adhesive';
      readonly mix: string;
      readonly lot: string;
      readonly roomC: number | null;
    } & OnConnectors)
  | ({ readonly type: 'use mix'; readonly mix: string } & OnConnectors)
  | ({
      readonly type: 'start load';
      readonly step: string;
      readonly load: string;
      readonly station: string;
    } & OnConnectors)
  | ({
      readonly type: 'end load';
      readonly load: string;
      readonly reason?: string;
      /** Id for the cool-down that begins as the tray comes out. */
      readonly nextLoad: string;
    } & OnBatch)
  | ({ readonly type: 'pass'; readonly step: string } & OnConnectors)
  | ({ readonly type: 'send back'; readonly to: string; readonly defect: string } & OnConnectors)
  | ({ readonly type: 'scrap'; readonly defect: string } & OnConnectors)
  | { readonly type: 'hold batch'; readonly batch: string; readonly reason: string }
  | { readonly type: 'resume batch'; readonly batch: string }
  | { readonly type: 'close batch'; readonly batch: string }
  | { readonly type: 'end batch short'; readonly batch: string; readonly defect: string }
  | { readonly type: 'reopen batch'; readonly batch: string }
  | { readonly type: 'undo'; readonly batch: string }
  | {
      readonly type: 'void';
      readonly batch: string;
      readonly targets: readonly EntryId[];
      readonly reason: string;
      /** Take back what rests on the targets too. */
      readonly andWhatRests: boolean;
    }
  | { readonly type: 'see clock'; readonly batch: string; readonly clock: string; readonly lateS: number }
  | ({ readonly type: 'set bench' } & FactOf<'benchSet'>['data'])
  | { readonly type: 'sign on'; readonly operator: string; readonly shift: string }
  | { readonly type: 'take recipe'; readonly recipeText: string }
  | {
      readonly type: 'set oven';
      readonly oven: string;
      readonly name: string;
      readonly setPointC: number;
      readonly warmUpS: number | null;
      readonly late?: Late;
    }
  | { readonly type: 'read oven'; readonly oven: string; readonly temperatureC: number; readonly late?: Late }
  | {
      readonly type: 'disturb oven';
      readonly oven: string;
      readonly what: 'door opened' | 'power cut';
      readonly late?: Late;
    }
  | { readonly type: 'state time'; readonly addedS: number };

export type CommandType = Command['type'];
