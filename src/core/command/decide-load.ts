import type { Batch, Bench, Load } from '../batch/types.ts';
import { cureOf } from '../cure/cure.ts';
import type { Draft } from '../event/entry.ts';
import type { FactOf } from '../event/facts.ts';
import { isTimed } from '../recipe/read.ts';
import type { Step } from '../recipe/schema.ts';
import { elapsedMs, type Moment } from '../unit/moment.ts';
import { ok } from '../unit/result.ts';
import type { Command } from './commands.ts';
import {
  checkAtStep,
  checkSize,
  gapOf,
  openFor,
  refuse,
  stepOf,
  whenHappened,
  type Context,
  type Decision,
} from './context.ts';

type Of<Type extends Command['type']> = Extract<Command, { type: Type }>;
type Ending = Pick<FactOf<'loadEnded'>['data'], 'verdict' | 'lateS' | 'dose' | 'coldestC'>;

export function decideStartLoad(bench: Bench, command: Of<'start load'>, context: Context): Decision {
  const open = openFor(bench, command.batch);
  if (!open.ok) return open;
  const found = stepOf(open.value, command.step);
  if (!found.ok) return found;
  const { step, index } = found.value;
  if (!isTimed(step)) return refuse({ code: 'step is not a load' });
  const unfit = checkAtStep(open.value, index, command.connectors) ?? checkSize(step, command.connectors.length);
  if (unfit) return refuse(unfit);
  if (command.station !== '' && step.kind === 'cure' && !bench.wide.ovens[command.station]) {
    return refuse({ code: 'oven unknown' });
  }
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  return ok([
    started(command.batch, command.load, step.id, command.connectors, command.station, {
      ...when.value.data,
      ...gapOf(bench, context),
    }),
  ]);
}

function started(
  batch: string,
  load: string,
  step: string,
  connectors: readonly number[],
  station: string,
  rest: Pick<FactOf<'loadStarted'>['data'], 'ago' | 'agoReason' | 'gap'>,
): Draft {
  const data = { load, step, connectors: [...connectors], station, ...rest };
  return { batch, type: 'loadStarted', v: 1, data };
}

/**
 * Ends a load. What comes out before its time, or after the longest dose, needs a reason; the dose, the coldest
 * temperature and the verdict are frozen in the entry. A cool-down that follows begins with the same tap.
 */
export function decideEndLoad(bench: Bench, command: Of<'end load'>, context: Context): Decision {
  const open = openFor(bench, command.batch, true);
  if (!open.ok) return open;
  const batch = open.value;
  const load = batch.loads.find((one) => one.id === command.load);
  if (!load) return refuse({ code: 'no such load' });
  if (load.ended) return refuse({ code: 'load ended' });
  const step = batch.recipe.steps[load.step];
  if (!step) return refuse({ code: 'no such step', step: String(load.step) });
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  if (elapsedMs(load.from, when.value.at) < 0) return refuse({ code: 'earlier than what it follows' });
  const ending = endingOf(bench, batch, load, step, when.value.at);
  const reason = command.reason?.trim() ?? '';
  if (reason === '' && ending.needsReason) return refuse(ending.needsReason);
  const ended: Draft = {
    batch: batch.id,
    type: 'loadEnded',
    v: 1,
    data: {
      load: load.id,
      ...ending.data,
      ...(reason === '' ? {} : { reason }),
      ...when.value.data,
      ...gapOf(bench, context),
    },
  };
  const next = batch.recipe.steps[load.step + 1];
  if (next?.kind !== 'wait' || batch.held) return ok([ended]);
  const inside = batch.connectors.filter(({ stands }) => stands.at === 'load' && stands.load === load.id);
  const numbers = inside.map((connector) => connector.number);
  if (numbers.length === 0) return ok([ended]);
  return ok([ended, started(batch.id, command.nextLoad, next.id, numbers, '', when.value.data)]);
}

interface Judgement {
  readonly data: Ending;
  readonly needsReason:
    | null
    | { code: 'too early'; leftS: number | null; dose: number | null }
    | { code: 'too late'; lateS: number; dose: number | null };
}

function endingOf(bench: Bench, batch: Batch, load: Load, step: Step, at: Moment): Judgement {
  const spanS = elapsedMs(load.from, at) / 1000;
  if (step.kind === 'cure') return cureEnding(bench, batch, load, step.setPointC, at);
  if (step.kind === 'wait') {
    const lateS = tenths(spanS - step.atLeastS);
    if (lateS >= 0) return { data: { verdict: 'in time', lateS }, needsReason: null };
    return { data: { verdict: 'early', lateS }, needsReason: { code: 'too early', leftS: -lateS, dose: null } };
  }
  if (step.kind === 'polish' && step.until.kind === 'time') {
    const lateS = tenths(spanS - step.until.aimS);
    if (lateS < -step.until.toleranceS) {
      return { data: { verdict: 'early', lateS }, needsReason: { code: 'too early', leftS: -lateS, dose: null } };
    }
    return { data: { verdict: lateS > step.until.toleranceS ? 'over' : 'in time', lateS }, needsReason: null };
  }
  return { data: { verdict: 'in time', lateS: 0 }, needsReason: null };
}

function cureEnding(bench: Bench, batch: Batch, load: Load, setPointC: number, at: Moment): Judgement {
  const oven = bench.wide.ovens[load.station]?.history ?? [];
  const cure = cureOf({ from: load.from, setPointC, adhesive: batch.recipe.adhesive, oven });
  const endMs = elapsedMs(load.from, at);
  const dose = cure.doseAt(endMs);
  const coldest = cure.coldestSinceCountingC(endMs);
  const lateS = cure.dueMs === null ? tenths(-endMs / 1000) : tenths((endMs - cure.dueMs) / 1000);
  const frozen = { dose: Math.round(dose * 1e4) / 1e4, ...(coldest === null ? {} : { coldestC: tenths(coldest) }) };
  if (cure.dueMs === null || endMs < cure.dueMs) {
    const leftS = cure.dueMs === null ? null : -lateS;
    return { data: { verdict: 'early', lateS, ...frozen }, needsReason: { code: 'too early', leftS, dose } };
  }
  if (cure.overMs !== null && endMs >= cure.overMs) {
    return { data: { verdict: 'over', lateS, ...frozen }, needsReason: { code: 'too late', lateS, dose } };
  }
  return { data: { verdict: 'in time', lateS, ...frozen }, needsReason: null };
}

const tenths = (value: number): number => Math.round(value * 10) / 10;
