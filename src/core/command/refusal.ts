import type { EntryId } from '../event/entry.ts';
import type { Problem } from '../recipe/problem.ts';

/** Why a command was refused. The words stand in the words catalogue, one sentence for each code. */
export type Refusal =
  | { readonly code: 'batch unknown'; readonly batch: string }
  | { readonly code: 'batch exists' }
  | { readonly code: 'batch is closed' }
  | { readonly code: 'batch is open' }
  | { readonly code: 'batch is held'; readonly reason: string }
  | { readonly code: 'batch is not held' }
  | { readonly code: 'connectors out of range'; readonly found: number; readonly most: number }
  | { readonly code: 'no connectors' }
  | { readonly code: 'no such connector'; readonly number: number }
  | { readonly code: 'not at this step'; readonly numbers: readonly number[] }
  | { readonly code: 'already finished'; readonly numbers: readonly number[] }
  | { readonly code: 'work order empty' }
  | { readonly code: 'text too long'; readonly field: TextField; readonly length: number; readonly most: number }
  | { readonly code: 'text missing'; readonly field: TextField }
  | { readonly code: 'serial twice'; readonly serial: string }
  | { readonly code: 'tag taken'; readonly tag: number }
  | { readonly code: 'no tag free' }
  | { readonly code: 'recipe not usable'; readonly problems: readonly Problem[] }
  | { readonly code: 'no such step'; readonly step: string }
  | { readonly code: 'step needs a load' }
  | { readonly code: 'step needs a judgement' }
  | { readonly code: 'step needs a mix' }
  | { readonly code: 'step is not a mix' }
  | { readonly code: 'step is not a load' }
  | { readonly code: 'step is not judged' }
  | { readonly code: 'load too large'; readonly found: number; readonly most: number }
  | { readonly code: 'one at a time' }
  | { readonly code: 'no such load' }
  | { readonly code: 'load ended' }
  | { readonly code: 'time unknown' }
  | { readonly code: 'mix unknown' }
  | { readonly code: 'mix is of another adhesive'; readonly mixed: string; readonly wanted: string }
  | { readonly code: 'mix is over'; readonly sinceS: number }
  | { readonly code: 'working life over'; readonly lateS: number }
  | { readonly code: 'too early'; readonly leftS: number | null; readonly dose: number | null }
  | { readonly code: 'too late'; readonly lateS: number; readonly dose: number | null }
  | { readonly code: 'target not earlier' }
  | { readonly code: 'defect unknown'; readonly defect: string }
  | { readonly code: 'crack is not polished out' }
  | { readonly code: 'repolish limit'; readonly numbers: readonly number[]; readonly most: number }
  | { readonly code: 'connectors unfinished'; readonly count: number }
  | { readonly code: 'ago out of range'; readonly mostS: number }
  | { readonly code: 'ago needs a reason' }
  | { readonly code: 'earlier than what it follows' }
  | { readonly code: 'nothing to undo' }
  | { readonly code: 'entry unknown' }
  | { readonly code: 'cannot take back a taking back' }
  | { readonly code: 'others rest on it'; readonly resting: readonly EntryId[] }
  | { readonly code: 'mix in use'; readonly batches: readonly string[] }
  | { readonly code: 'oven unknown' }
  | {
      readonly code: 'temperature out of range';
      readonly found: number;
      readonly lowest: number;
      readonly highest: number;
    }
  | { readonly code: 'warm-up out of range'; readonly found: number; readonly mostS: number }
  | { readonly code: 'too many'; readonly what: 'operators' | 'shifts'; readonly most: number }
  | { readonly code: 'initials unfit'; readonly found: string }
  | { readonly code: 'initials twice'; readonly found: string }
  | { readonly code: 'operator unknown'; readonly operator: string }
  | { readonly code: 'shift time unfit'; readonly shift: string; readonly found: string }
  | { readonly code: 'time out of range'; readonly mostS: number }
  | { readonly code: 'does not fit'; readonly why: string };

export type RefusalCode = Refusal['code'];

export type TextField = 'work order' | 'lot' | 'reason' | 'tablet name' | 'oven name' | 'shift name' | 'serial';
