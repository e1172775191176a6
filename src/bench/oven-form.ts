import type { Command, Late } from '../core/command/commands.ts';
import { agoNeedsReasonS } from '../core/command/context.ts';
import type { Refusal } from '../core/command/refusal.ts';
import type { Oven } from '../core/batch/types.ts';
import { failed, ok, type Result } from '../core/unit/result.ts';
import { parseNumber } from '../ui/parse-number.ts';
import { decimals } from '../words/format.ts';
import type { Words } from '../words/index.ts';
import { numberProblem } from './number-problem.ts';
import { lastSetting } from './oven-list.ts';

export type Disturbance = 'door opened' | 'power cut';

/** What is being entered about an oven. */
export type OvenAsk =
  | { readonly kind: 'add'; readonly oven: string }
  | { readonly kind: 'set'; readonly oven: Oven }
  | { readonly kind: 'read'; readonly oven: Oven }
  | { readonly kind: 'disturb'; readonly oven: Oven };

/** What was typed, as it stands in the fields. */
export interface OvenForm {
  readonly name: string;
  readonly setPoint: string;
  readonly warmUp: string;
  readonly reading: string;
  readonly what: Disturbance;
  readonly minutesAgo: string;
  readonly reason: string;
}

/** Sentences at the fields. */
export type OvenErrors = Partial<Record<keyof OvenForm, string>>;

export function emptyForm(ask: OvenAsk): OvenForm {
  const blank = { reading: '', what: 'door opened', minutesAgo: '', reason: '' } as const;
  if (ask.kind !== 'set') return { ...blank, name: '', setPoint: '', warmUp: '' };
  const set = lastSetting(ask.oven);
  return {
    ...blank,
    name: ask.oven.name,
    setPoint: set ? decimals(set.setPointC, 1) : '',
    warmUp: set?.warmUpS ? decimals(set.warmUpS / 60, 1) : '',
  };
}

/** What a typed number may be before the command is decided: what is out of range is refused there, in one place. */
const anyC = { lowest: -9999, highest: 9999, unit: '°C', decimals: 1 };
const anyMinutes = { lowest: 0, highest: 9999, unit: 'min', decimals: 1 };

/** The command for what was typed, or a sentence for each field that cannot be read. */
export function ovenCommand(ask: OvenAsk, form: OvenForm, words: Words): Result<Command, OvenErrors> {
  const errors: { -readonly [Field in keyof OvenForm]?: string } = {};
  const number = (field: 'setPoint' | 'warmUp' | 'reading' | 'minutesAgo', rule: typeof anyC): number => {
    const read = parseNumber(form[field], rule);
    if (!read.ok) errors[field] = numberProblem(words, read.error);
    return read.ok ? read.value : 0;
  };
  const isBlank = (typed: string) => typed.trim() === '';
  if (ask.kind === 'disturb' && isBlank(form.minutesAgo)) errors.minutesAgo = words.ovens.sheet.agoNeeded;
  const agoS = isBlank(form.minutesAgo) ? 0 : number('minutesAgo', anyMinutes) * 60;
  const late: { late?: Late } = agoS === 0 ? {} : { late: { agoS, reason: form.reason } };
  const command = ((): Command => {
    switch (ask.kind) {
      case 'add':
      case 'set': {
        const oven = ask.kind === 'add' ? ask.oven : ask.oven.id;
        const setPointC = number('setPoint', anyC);
        const warmUpS = isBlank(form.warmUp) ? null : number('warmUp', anyMinutes) * 60;
        return { type: 'set oven', oven, name: form.name, setPointC, warmUpS, ...late };
      }
      case 'read':
        return { type: 'read oven', oven: ask.oven.id, temperatureC: number('reading', anyC), ...late };
      case 'disturb':
        return { type: 'disturb oven', oven: ask.oven.id, what: form.what, ...late };
    }
  })();
  return Object.keys(errors).length > 0 ? failed(errors) : ok(command);
}

/** Past two minutes an entry says why it is late. */
export function needsReason(minutesAgo: string): boolean {
  const read = parseNumber(minutesAgo, anyMinutes);
  return read.ok && read.value * 60 > agoNeedsReasonS;
}

/** At which field a refusal is shown. */
export function ovenFieldOf(refusal: Refusal, ask: OvenAsk): keyof OvenForm {
  switch (refusal.code) {
    case 'warm-up out of range':
      return 'warmUp';
    case 'ago out of range':
      return 'minutesAgo';
    case 'ago needs a reason':
      return 'reason';
    case 'text missing':
    case 'text too long':
      return refusal.field === 'reason' ? 'reason' : 'name';
    default:
      return ask.kind === 'read' ? 'reading' : ask.kind === 'disturb' ? 'minutesAgo' : 'setPoint';
  }
}
