import type { Entry } from '../event/entry.ts';
import type { FactOf } from '../event/facts.ts';
import { move, pick, settle, unfinished, type Happened, type OpenConnector } from './connectors.ts';
import type { Moment } from '../unit/moment.ts';
import type { MisfitReason } from './misfit-reasons.ts';
import type { OpenBatch } from './open-batch.ts';

type Of<Type extends Entry['type']> = Entry & FactOf<Type>;

/** The reason that a load carries when its last connector was taken out of it one by one. */
export const allTakenOut = 'all taken out';

function stepNow(connector: OpenConnector): number {
  return connector.stands.at === 'passed' ? -1 : connector.stands.step;
}

/** Ends every load that nothing is in any more. */
function emptyLoads(batch: OpenBatch, at: Moment, by: string): void {
  batch.loads.forEach((load, position) => {
    if (load.ended) return;
    const inside = batch.connectors.some(({ stands }) => stands.at === 'load' && stands.load === load.id);
    if (!inside)
      batch.loads[position] = { ...load, ended: { at, by, verdict: 'early', lateS: 0, reason: allTakenOut } };
  });
}

export function applySentBack(batch: OpenBatch, entry: Of<'sentBack'>, happened: Happened): MisfitReason | null {
  const { data } = entry;
  const to = batch.stepIndex(data.to);
  if (to < 0) return 'no such step';
  const picked = pick(batch.connectors, data.connectors);
  if (typeof picked === 'string') return picked;
  for (const connector of picked) {
    if (!unfinished(connector)) return 'already finished';
    const from = stepNow(connector);
    const earlier = connector.stands.at === 'load' ? to <= from : to < from;
    if (!earlier) return 'target not earlier';
  }
  const when = settle(picked, happened);
  if (!when) return 'earlier than what it follows';
  for (const connector of picked) {
    const from = stepNow(connector);
    const again = data.attempt === 'new';
    move(
      connector,
      { at: 'step', step: to },
      { kind: 'sent back', from, to, defect: data.defect, attempt: data.attempt, at: when, by: entry.by, entry },
    );
    connector.attempt += again ? 1 : 0;
    connector.reworks = again ? 0 : connector.reworks + 1;
    const mixStep = batch.recipe.steps.findIndex((step) => step.kind === 'mix');
    if (to <= mixStep) connector.mix = null;
  }
  emptyLoads(batch, when, entry.by);
  return null;
}

export function applyScrapped(batch: OpenBatch, entry: Of<'scrapped'>, happened: Happened): MisfitReason | null {
  const { data } = entry;
  const picked = pick(batch.connectors, data.connectors);
  if (typeof picked === 'string') return picked;
  if (!picked.every(unfinished)) return 'already finished';
  const when = settle(picked, happened);
  if (!when) return 'earlier than what it follows';
  for (const connector of picked) scrap(connector, data.defect, when, entry);
  emptyLoads(batch, when, entry.by);
  return null;
}

export function applyBatchClosed(batch: OpenBatch, entry: Of<'batchClosed'>, happened: Happened): MisfitReason | null {
  const { how, defect } = entry.data;
  const rest = batch.connectors.filter(unfinished);
  if (how === 'complete' && rest.length > 0) return 'connectors unfinished';
  if (how === 'short' && rest.length > 0 && defect === undefined) return 'defect missing';
  const when = settle(rest, happened);
  if (!when) return 'earlier than what it follows';
  for (const connector of rest) scrap(connector, defect ?? '', when, entry);
  emptyLoads(batch, when, entry.by);
  batch.closed = { how, at: when };
  return null;
}

function scrap(connector: OpenConnector, defect: string, at: Moment, entry: Entry): void {
  const step = stepNow(connector);
  connector.mix = null;
  move(connector, { at: 'scrapped', defect, step }, { kind: 'scrapped', step, defect, at, by: entry.by, entry });
}
