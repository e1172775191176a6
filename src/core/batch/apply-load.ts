import type { Entry } from '../event/entry.ts';
import type { FactOf } from '../event/facts.ts';
import { isTimed } from '../recipe/read.ts';
import { elapsedMs } from '../unit/moment.ts';
import { move, pick, settle, standsAfter, type Happened } from './connectors.ts';
import { handsOnShareMs } from './hands-on.ts';
import type { MisfitReason } from './misfit-reasons.ts';
import type { OpenBatch } from './open-batch.ts';
import { limitedByMix, unattended } from './step-kinds.ts';

type Of<Type extends Entry['type']> = Entry & FactOf<Type>;

export function applyLoadStarted(batch: OpenBatch, entry: Of<'loadStarted'>, happened: Happened): MisfitReason | null {
  const { data } = entry;
  const index = batch.stepIndex(data.step);
  const step = batch.recipe.steps[index];
  if (!step) return 'no such step';
  if (!isTimed(step)) return 'not a load step';
  if (batch.loads.some((load) => load.id === data.load)) return 'load known already';
  const picked = pick(batch.connectors, data.connectors);
  if (typeof picked === 'string') return picked;
  for (const { stands } of picked) if (stands.at !== 'step' || stands.step !== index) return 'not at this step';
  const when = settle(picked, happened);
  if (!when) return 'earlier than what it follows';
  const handsOnMs = handsOnShareMs(step, picked.length, data.gap);
  const releases = limitedByMix(batch.recipe, index);
  const stands = { at: 'load', load: data.load, step: index } as const;
  const happening = { kind: 'loaded', step: index, load: data.load, handsOnMs, at: when, by: entry.by, entry } as const;
  for (const connector of picked) {
    // A working life that ends in an oven is kept once the tray is in.
    if (releases) connector.mix = null;
    move(connector, stands, happening);
  }
  batch.loads.push({
    id: data.load,
    step: index,
    connectors: data.connectors,
    station: data.station,
    from: when,
    ended: null,
  });
  return null;
}

export function applyLoadEnded(batch: OpenBatch, entry: Of<'loadEnded'>, happened: Happened): MisfitReason | null {
  const { data } = entry;
  const position = batch.loads.findLastIndex((load) => load.id === data.load);
  const load = batch.loads[position];
  if (!load) return 'no such load';
  if (load.ended) return 'load ended already';
  const step = batch.recipe.steps[load.step];
  if (!step) return 'no such step';
  const inside = batch.connectors.filter((one) => one.stands.at === 'load' && one.stands.load === load.id);
  const when = settle(inside, happened);
  if (!when) return 'earlier than what it follows';
  const handsOnMs = unattended(step) ? 0 : handsOnShareMs(step, Math.max(1, inside.length), data.gap);
  const spanMs = elapsedMs(load.from, when);
  const stands = standsAfter(batch.recipe, load.step);
  const happening = {
    kind: 'unloaded',
    step: load.step,
    load: load.id,
    spanMs,
    verdict: data.verdict,
    handsOnMs,
    at: when,
    by: entry.by,
    entry,
  } as const;
  for (const connector of inside) move(connector, stands, happening);
  batch.loads[position] = { ...load, ended: { ...endingOf(data), at: when, by: entry.by } };
  return null;
}

function endingOf(data: FactOf<'loadEnded'>['data']) {
  return {
    verdict: data.verdict,
    lateS: data.lateS,
    ...(data.dose === undefined ? {} : { dose: data.dose }),
    ...(data.coldestC === undefined ? {} : { coldestC: data.coldestC }),
    ...(data.reason === undefined ? {} : { reason: data.reason }),
  };
}
