import type { Entry } from '../event/entry.ts';
import type { FactOf } from '../event/facts.ts';
import { isTimed } from '../recipe/read.ts';
import { move, pick, settle, standsAfter, unfinished, type Happened, type OpenConnector } from './connectors.ts';
import { handsOnShareMs } from './hands-on.ts';
import type { MisfitReason } from './misfit-reasons.ts';
import type { OpenBatch } from './open-batch.ts';
import { judges, limitedByMix } from './step-kinds.ts';

type Of<Type extends Entry['type']> = Entry & FactOf<Type>;

/** The connectors that an entry names, all standing at the step that it names. */
function atStep(batch: OpenBatch, index: number, numbers: readonly number[]): OpenConnector[] | MisfitReason {
  const picked = pick(batch.connectors, numbers);
  if (typeof picked === 'string') return picked;
  const all = picked.every(({ stands }) => stands.at === 'step' && stands.step === index);
  return all ? picked : 'not at this step';
}

export function applyStepFinished(
  batch: OpenBatch,
  entry: Of<'stepFinished'>,
  happened: Happened,
): MisfitReason | null {
  const { data } = entry;
  const index = batch.stepIndex(data.step);
  const step = batch.recipe.steps[index];
  if (!step) return 'no such step';
  if (isTimed(step)) return 'needs a load';
  if (judges(step)) return 'needs a judgement';
  if (step.kind === 'mix' && data.mix === undefined) return 'needs a mix';
  if (step.kind !== 'mix' && data.mix !== undefined) return 'no mix here';
  const picked = atStep(batch, index, data.connectors);
  if (typeof picked === 'string') return picked;
  const when = settle(picked, happened);
  if (!when) return 'earlier than what it follows';
  const handsOnMs = handsOnShareMs(step, picked.length, data.gap);
  const overrunS = data.overrun?.lateS ?? 0;
  const releases = limitedByMix(batch.recipe, index);
  const stands = standsAfter(batch.recipe, index);
  const finished = { kind: 'finished', step: index, handsOnMs, overrunS, at: when, by: entry.by, entry } as const;
  const happening = data.overrun ? { ...finished, overrunReason: data.overrun.reason } : finished;
  for (const connector of picked) {
    move(connector, stands, happening);
    if (data.mix !== undefined) connector.mix = connector.mixSeen = data.mix;
    else if (releases) connector.mix = null;
  }
  return null;
}

export function applyMixChanged(batch: OpenBatch, entry: Of<'mixChanged'>, happened: Happened): MisfitReason | null {
  const picked = pick(batch.connectors, entry.data.connectors);
  if (typeof picked === 'string') return picked;
  if (!picked.every((connector) => unfinished(connector) && connector.mix !== null)) return 'no mix here';
  if (!settle(picked, happened)) return 'earlier than what it follows';
  for (const connector of picked) connector.mix = connector.mixSeen = entry.data.mix;
  return null;
}

export function applyJudged(batch: OpenBatch, entry: Of<'judged'>, happened: Happened): MisfitReason | null {
  const { data } = entry;
  const index = batch.stepIndex(data.step);
  const step = batch.recipe.steps[index];
  if (!step) return 'no such step';
  if (!judges(step)) return 'not judged here';
  if (data.verdict === 'fail' && data.defect === undefined) return 'defect missing';
  const picked = atStep(batch, index, data.connectors);
  if (typeof picked === 'string') return picked;
  const when = settle(picked, happened);
  if (!when) return 'earlier than what it follows';
  const handsOnMs = handsOnShareMs(step, picked.length, data.gap);
  const happening = {
    kind: 'judged',
    step: index,
    verdict: data.verdict,
    defect: data.defect ?? null,
    handsOnMs,
    at: when,
    by: entry.by,
    entry,
  } as const;
  const passes = data.verdict === 'pass';
  const after = passes ? standsAfter(batch.recipe, index) : null;
  const releases = passes && limitedByMix(batch.recipe, index);
  for (const connector of picked) {
    if (releases) connector.mix = null;
    move(connector, after ?? connector.stands, happening);
  }
  return null;
}
