import { judges, limitedByMix } from '../batch/step-kinds.ts';
import type { Batch, Bench, Mix } from '../batch/types.ts';
import { workingLifeSeconds } from '../cure/working-life.ts';
import { benchWide, type Draft } from '../event/entry.ts';
import { isTimed } from '../recipe/read.ts';
import { elapsedMs, type Moment } from '../unit/moment.ts';
import { ok } from '../unit/result.ts';
import type { Command } from './commands.ts';
import {
  checkAtStep,
  checkKnown,
  checkSize,
  gapOf,
  openFor,
  refuse,
  requiredText,
  stepOf,
  whenHappened,
  type Context,
  type Decision,
} from './context.ts';
import { checkTemperature, roomRangeC } from './ranges.ts';
import type { Refusal } from './refusal.ts';

type Of<Type extends Command['type']> = Extract<Command, { type: Type }>;

export function decideFinishStep(bench: Bench, command: Of<'finish step'>, context: Context): Decision {
  const open = openFor(bench, command.batch);
  if (!open.ok) return open;
  const found = stepOf(open.value, command.step);
  if (!found.ok) return found;
  const { step, index } = found.value;
  if (isTimed(step)) return refuse({ code: 'step needs a load' });
  if (judges(step)) return refuse({ code: 'step needs a judgement' });
  if (step.kind === 'mix') return refuse({ code: 'step needs a mix' });
  const unfit = checkAtStep(open.value, index, command.connectors) ?? checkSize(step, command.connectors.length);
  if (unfit) return refuse(unfit);
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  const limited = limitedByMix(open.value.recipe, index);
  if (limited && bench.wide.unknownGap) return refuse({ code: 'time unknown' });
  const lateS = limited ? workingLifeOverS(bench, open.value, command.connectors, when.value.at) : 0;
  const reason = command.overrunReason?.trim() ?? '';
  if (lateS > 0 && reason === '') return refuse({ code: 'working life over', lateS });
  const draft: Draft = {
    batch: command.batch,
    type: 'stepFinished',
    v: 1,
    data: {
      step: command.step,
      connectors: [...command.connectors],
      ...(lateS > 0 ? { overrun: { lateS, reason } } : {}),
      ...when.value.data,
      ...gapOf(bench, context),
    },
  };
  return ok([draft]);
}

/** Seconds by which the working life of these connectors' mixes was over; 0 where none was. */
function workingLifeOverS(bench: Bench, batch: Batch, numbers: readonly number[], at: Moment): number {
  const overs = numbers.map((number) => {
    const id = batch.connectors[number - 1]?.mix;
    const mix = id === undefined || id === null ? undefined : bench.wide.mixes[id];
    return mix ? overS(mix, at) : 0;
  });
  return Math.max(0, ...overs);
}

const overS = (mix: Mix, at: Moment): number =>
  Math.max(0, Math.round(elapsedMs(mix.mixed, at) / 1000 - mix.workingLifeS));

/** Mixes anew: for connectors at the mix step, or for ones already past it whose mix will not last. */
export function decideMixAdhesive(bench: Bench, command: Of<'mix adhesive'>, context: Context): Decision {
  const open = openFor(bench, command.batch);
  if (!open.ok) return open;
  const lot = requiredText(command.lot, 'lot', 60);
  if (!lot.ok) return lot;
  const unfit = command.roomC === null ? null : checkTemperature(command.roomC, roomRangeC);
  if (unfit) return refuse(unfit);
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  const taken = takeMix(bench, open.value, command.mix, command.connectors, when.value.data, context);
  if (!taken.ok) return taken;
  const { adhesive } = open.value.recipe;
  const mixed: Draft = {
    batch: benchWide,
    type: 'adhesiveMixed',
    v: 1,
    data: {
      mix: command.mix,
      adhesive: adhesive.name,
      lot: lot.value,
      roomC: command.roomC,
      workingLifeS: workingLifeSeconds(adhesive, command.roomC),
      ...when.value.data,
    },
  };
  return ok([mixed, ...taken.value]);
}

/** Takes a mix that another batch began, while it lasts. */
export function decideUseMix(bench: Bench, command: Of<'use mix'>, context: Context): Decision {
  const open = openFor(bench, command.batch);
  if (!open.ok) return open;
  const mix = bench.wide.mixes[command.mix];
  if (!mix) return refuse({ code: 'mix unknown' });
  const wanted = open.value.recipe.adhesive.name;
  if (mix.adhesive !== wanted) return refuse({ code: 'mix is of another adhesive', mixed: mix.adhesive, wanted });
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  const sinceS = overS(mix, when.value.at);
  if (sinceS > 0) return refuse({ code: 'mix is over', sinceS });
  return takeMix(bench, open.value, command.mix, command.connectors, when.value.data, context);
}

function takeMix(
  bench: Bench,
  batch: Batch,
  mix: string,
  numbers: readonly number[],
  late: { ago?: number; agoReason?: string },
  context: Context,
): Decision {
  const unknown = checkKnown(batch, numbers);
  if (unknown) return refuse(unknown);
  const connectors = [...numbers];
  const gap = gapOf(bench, context);
  if (numbers.every((number) => batch.connectors[number - 1]?.mix != null)) {
    return ok([{ batch: batch.id, type: 'mixChanged', v: 1, data: { mix, connectors, ...gap } }]);
  }
  const index = mixStepOf(batch, numbers);
  const step = batch.recipe.steps[index];
  if (step?.kind !== 'mix') return refuse({ code: 'step is not a mix' });
  const unfit: Refusal | null = checkAtStep(batch, index, numbers);
  if (unfit) return refuse(unfit);
  return ok([
    { batch: batch.id, type: 'stepFinished', v: 1, data: { step: step.id, connectors, mix, ...late, ...gap } },
  ]);
}

function mixStepOf(batch: Batch, numbers: readonly number[]): number {
  const stands = batch.connectors[(numbers[0] ?? 0) - 1]?.stands;
  return stands?.at === 'step' ? stands.step : -1;
}
