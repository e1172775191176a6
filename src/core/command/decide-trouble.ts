import { judges } from '../batch/step-kinds.ts';
import type { Batch, Bench, Connector } from '../batch/types.ts';
import type { Draft } from '../event/entry.ts';
import { crackDefect, firstCure, reterminates } from '../recipe/read.ts';
import { ok } from '../unit/result.ts';
import type { Command } from './commands.ts';
import {
  checkAtStep,
  checkKnown,
  checkUnfinished,
  gapOf,
  openFor,
  refuse,
  stepOf,
  whenHappened,
  type Context,
  type Decision,
} from './context.ts';
import type { Refusal } from './refusal.ts';

type Of<Type extends Command['type']> = Extract<Command, { type: Type }>;

export function decidePass(bench: Bench, command: Of<'pass'>, context: Context): Decision {
  const open = openFor(bench, command.batch);
  if (!open.ok) return open;
  const found = stepOf(open.value, command.step);
  if (!found.ok) return found;
  const { step, index } = found.value;
  if (!judges(step)) return refuse({ code: 'step is not judged' });
  const unfit = checkAtStep(open.value, index, command.connectors);
  if (unfit) return refuse(unfit);
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  const draft: Draft = {
    batch: command.batch,
    type: 'judged',
    v: 1,
    data: {
      step: step.id,
      connectors: [...command.connectors],
      verdict: 'pass',
      ...when.value.data,
      ...gapOf(bench, context),
    },
  };
  return ok([draft]);
}

/** Whether going back to this step means cutting off: it lies before the cure, and the connector was cured. */
function beginsAnew(batch: Batch, { stands }: Connector, to: number): boolean {
  return 'step' in stands && reterminates(batch.recipe, stands.step, to);
}

export function decideSendBack(bench: Bench, command: Of<'send back'>, context: Context): Decision {
  const checked = checkTrouble(bench, command);
  if (!checked.ok) return checked;
  const batch = checked.value;
  const target = stepOf(batch, command.to);
  if (!target.ok) return target;
  const to = target.value.index;
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  const connectors = command.connectors.flatMap((number) => batch.connectors[number - 1] ?? []);
  for (const { stands } of connectors) {
    const from = 'step' in stands ? stands.step : -1;
    if (!(stands.at === 'load' ? to <= from : to < from)) return refuse({ code: 'target not earlier' });
  }
  const anew = connectors.filter((connector) => beginsAnew(batch, connector, to));
  const again = connectors.filter((connector) => !anew.includes(connector));
  const limit = checkAgain(batch, again, command.defect, to);
  if (limit) return refuse(limit);
  const sent = (some: readonly Connector[], attempt: 'same' | 'new'): Draft[] =>
    some.length === 0
      ? []
      : [
          {
            batch: batch.id,
            type: 'sentBack',
            v: 1,
            data: { connectors: numbersOf(some), to: command.to, defect: command.defect, attempt, ...when.value.data },
          },
        ];
  return ok(
    withGap(bench, context, [
      ...failed(batch, connectors, command.defect, when.value.data),
      ...sent(again, 'same'),
      ...sent(anew, 'new'),
    ]),
  );
}

/** A crack is not polished out (NASA-STD-8739.5A), and nothing is polished more often than the recipe allows. */
function checkAgain(batch: Batch, again: readonly Connector[], defect: string, to: number): Refusal | null {
  const cure = firstCure(batch.recipe) ?? -1;
  const polishes = again.filter(({ stands }) => 'step' in stands && stands.step > cure && to > cure);
  if (defect === crackDefect && polishes.length > 0) return { code: 'crack is not polished out' };
  const most = batch.recipe.repolishLimit;
  const worn = polishes.filter((connector) => connector.reworks >= most);
  return worn.length > 0 ? { code: 'repolish limit', numbers: numbersOf(worn), most } : null;
}

export function decideScrap(bench: Bench, command: Of<'scrap'>, context: Context): Decision {
  const checked = checkTrouble(bench, command, true);
  if (!checked.ok) return checked;
  const batch = checked.value;
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  const connectors = command.connectors.flatMap((number) => batch.connectors[number - 1] ?? []);
  const data = { connectors: numbersOf(connectors), defect: command.defect, ...when.value.data };
  const scrapped: Draft = { batch: batch.id, type: 'scrapped', v: 1, data };
  return ok(withGap(bench, context, [...failed(batch, connectors, command.defect, when.value.data), scrapped]));
}

function checkTrouble(bench: Bench, command: Of<'send back' | 'scrap'>, heldToo = false) {
  const open = openFor(bench, command.batch, heldToo);
  if (!open.ok) return open;
  const unfit = checkKnown(open.value, command.connectors) ?? checkUnfinished(open.value, command.connectors);
  if (unfit) return refuse(unfit);
  if (!open.value.recipe.defects.some((defect) => defect.code === command.defect)) {
    return refuse({ code: 'defect unknown', defect: command.defect });
  }
  return open;
}

/** The failing verdicts that go with sending back or scrapping from a step that judges. */
function failed(
  batch: Batch,
  connectors: readonly Connector[],
  defect: string,
  late: { ago?: number; agoReason?: string },
): Draft[] {
  if (batch.held) return [];
  const byStep = new Map<number, Connector[]>();
  for (const connector of connectors) {
    if (connector.stands.at !== 'step') continue;
    byStep.set(connector.stands.step, [...(byStep.get(connector.stands.step) ?? []), connector]);
  }
  return [...byStep].flatMap(([index, some]): Draft[] => {
    const step = batch.recipe.steps[index];
    if (!step || !judges(step)) return [];
    const data = { step: step.id, connectors: numbersOf(some), verdict: 'fail' as const, defect, ...late };
    return [{ batch: batch.id, type: 'judged', v: 1, data }];
  });
}

const numbersOf = (connectors: readonly Connector[]): number[] => connectors.map((connector) => connector.number);

/** The gap since the person's previous entry belongs to the first entry of a command alone. */
function withGap(bench: Bench, context: Context, drafts: readonly Draft[]): readonly Draft[] {
  return drafts.map((draft, index) =>
    index === 0 ? ({ ...draft, data: { ...draft.data, ...gapOf(bench, context) } } as Draft) : draft,
  );
}
