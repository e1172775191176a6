import { enteredAt, type Entry } from '../event/entry.ts';
import type { FactOf } from '../event/facts.ts';
import type { Recipe } from '../recipe/schema.ts';
import { shifted } from '../unit/moment.ts';
import { applyLoadEnded, applyLoadStarted } from './apply-load.ts';
import { applyJudged, applyMixChanged, applyStepFinished } from './apply-step.ts';
import { applyBatchClosed, applyScrapped, applySentBack } from './apply-trouble.ts';
import type { Happened } from './connectors.ts';
import type { MisfitReason } from './misfit-reasons.ts';
import { stepIndexIn, type OpenBatch } from './open-batch.ts';
import { EntryTrace } from './trace.ts';

export function openBatch(entry: Entry & FactOf<'batchOpened'>, recipe: Recipe): OpenBatch {
  const opened = enteredAt(entry);
  return {
    id: entry.batch,
    tag: entry.data.tag,
    workOrder: entry.data.workOrder,
    recipeHash: entry.data.recipe,
    recipe,
    opened,
    openedBy: entry.by,
    connectors: entry.data.connectors.map((named, index) => ({
      number: index + 1,
      serial: named.serial ?? null,
      end: named.end ?? null,
      fibre: named.fibre ?? null,
      attempt: 1,
      reworks: 0,
      since: opened,
      stands: { at: 'step', step: 0 },
      mix: null,
      mixSeen: null,
      history: [],
    })),
    loads: [],
    held: null,
    closed: null,
    seen: {},
    traces: [],
    misfits: [],
    stepIndex: (id) => stepIndexIn(recipe, id),
  };
}

/** What a held batch still takes: trays must come out of ovens, and nothing that was found may be lost. */
const allowedWhileHeld: ReadonlySet<Entry['type']> = new Set([
  'loadEnded',
  'scrapped',
  'clockSeen',
  'batchResumed',
  'batchClosed',
]);

/** Applies one entry: changes the batch, or changes nothing and keeps the entry as a misfit. */
export function applyToBatch(batch: OpenBatch, entry: Entry): void {
  const ago = 'ago' in entry.data ? (entry.data.ago ?? 0) : 0;
  const at = ago === 0 ? enteredAt(entry) : shifted(enteredAt(entry), -ago * 1000);
  const misfit = refusal(batch, entry) ?? change(batch, entry, { at, late: ago > 0 });
  if (misfit) batch.misfits.push({ entry: { log: entry.log, seq: entry.seq }, type: entry.type, why: misfit });
  else batch.traces.push(new EntryTrace(entry, at, stepOfEntry(batch, entry), connectorsOf(batch, entry)));
}

function refusal(batch: OpenBatch, entry: Entry): MisfitReason | null {
  if (batch.closed && entry.type !== 'clockSeen') return 'batch closed';
  if (batch.held && !allowedWhileHeld.has(entry.type)) return 'batch held';
  return null;
}

function change(batch: OpenBatch, entry: Entry, happened: Happened): MisfitReason | null {
  switch (entry.type) {
    case 'stepFinished':
      return applyStepFinished(batch, entry, happened);
    case 'loadStarted':
      return applyLoadStarted(batch, entry, happened);
    case 'loadEnded':
      return applyLoadEnded(batch, entry, happened);
    case 'judged':
      return applyJudged(batch, entry, happened);
    case 'sentBack':
      return applySentBack(batch, entry, happened);
    case 'scrapped':
      return applyScrapped(batch, entry, happened);
    case 'mixChanged':
      return applyMixChanged(batch, entry, happened);
    case 'clockSeen':
      batch.seen = { ...batch.seen, [entry.data.clock]: { at: happened.at, lateS: entry.data.lateS } };
      return null;
    case 'batchHeld':
      batch.held = { reason: entry.data.reason, since: happened.at };
      return null;
    case 'batchResumed':
      if (!batch.held) return 'batch not held';
      batch.held = null;
      return null;
    case 'tagChanged':
      batch.tag = entry.data.tag;
      return null;
    case 'batchClosed':
      return applyBatchClosed(batch, entry, happened);
    case 'batchOpened':
      return 'batch opened twice';
    default:
      return 'unknown entry';
  }
}

function connectorsOf(batch: OpenBatch, entry: Entry): readonly number[] {
  if (entry.type === 'loadEnded') {
    return batch.loads.findLast((load) => load.id === entry.data.load)?.connectors ?? [];
  }
  return 'connectors' in entry.data && entry.type !== 'batchOpened' ? entry.data.connectors : [];
}

function stepOfEntry(batch: OpenBatch, entry: Entry): number | null {
  if (entry.type === 'loadEnded') return batch.loads.findLast((load) => load.id === entry.data.load)?.step ?? null;
  if ('step' in entry.data) return batch.stepIndex(entry.data.step);
  return null;
}
