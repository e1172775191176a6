import type { BenchWide } from '../core/batch/types.ts';
import type { Command } from '../core/command/commands.ts';
import { decideSetBench } from '../core/command/decide-bench.ts';
import type { Refusal } from '../core/command/refusal.ts';
import { failed, ok, type Result } from '../core/unit/result.ts';

export interface ShiftDraft {
  readonly name: string;
  readonly from: string;
  readonly to: string;
}

/** What is typed about tablet, people and shifts, until it is saved. */
export interface BenchDraft {
  readonly tablet: string;
  readonly operators: readonly string[];
  readonly shifts: readonly ShiftDraft[];
}

export { mostOperators, mostShifts } from '../core/command/decide-bench.ts';

export function draftOf({ tablet, operators, shifts }: BenchWide): BenchDraft {
  return { tablet, operators, shifts };
}

/** Whether the two say the same, times of day in any way of writing. */
export function sameDraft(a: BenchDraft, b: BenchDraft): boolean {
  return JSON.stringify(setBenchCommand(a)) === JSON.stringify(setBenchCommand(b));
}

/** A time of day as people type it: "6", "6:30", "0630", "6.30". What is none comes back as it is. */
export function clockTyped(typed: string): string {
  const [, hours, minutes] = /^(\d{1,2})(?:[:.]?(\d\d))?$/.exec(typed.trim()) ?? [];
  return hours === undefined ? typed.trim() : `${hours.padStart(2, '0')}:${minutes ?? '00'}`;
}

export function setBenchCommand(draft: BenchDraft): Extract<Command, { type: 'set bench' }> {
  return {
    type: 'set bench',
    tablet: draft.tablet.trim(),
    operators: [...draft.operators],
    shifts: draft.shifts.map(({ name, from, to }) => ({
      name: name.trim(),
      from: clockTyped(from),
      to: clockTyped(to),
    })),
  };
}

/** Adds a person by initials, in capitals. What is refused is what saving would refuse. */
export function withOperator(draft: BenchDraft, typed: string): Result<BenchDraft, Refusal> {
  const operators = [...draft.operators, typed.trim().toUpperCase()];
  const decision = decideSetBench({ type: 'set bench', tablet: 'any', operators, shifts: [] });
  return decision.ok ? ok({ ...draft, operators }) : failed(decision.error);
}

export function withoutOperator(draft: BenchDraft, initials: string): BenchDraft {
  return { ...draft, operators: draft.operators.filter((one) => one !== initials) };
}

export function withShift(draft: BenchDraft): BenchDraft {
  return { ...draft, shifts: [...draft.shifts, { name: '', from: '', to: '' }] };
}

export function changeShift(draft: BenchDraft, place: number, changed: Partial<ShiftDraft>): BenchDraft {
  return {
    ...draft,
    shifts: draft.shifts.map((shift, index) => (index === place ? { ...shift, ...changed } : shift)),
  };
}

export function withoutShift(draft: BenchDraft, place: number): BenchDraft {
  return { ...draft, shifts: draft.shifts.filter((_, index) => index !== place) };
}

/** At which field a refusal is shown. */
export type RefusedAt =
  | { readonly at: 'tablet' }
  | { readonly at: 'operators' }
  | { readonly at: 'shift'; readonly place: number; readonly field: keyof ShiftDraft };

export function refusedAt(refusal: Refusal, draft: BenchDraft): RefusedAt {
  if (refusal.code === 'initials unfit' || refusal.code === 'initials twice') return { at: 'operators' };
  const { shifts } = setBenchCommand(draft);
  if (refusal.code === 'shift time unfit') {
    const { found, shift } = refusal;
    const place = shifts.findIndex(({ name, from, to }) => name === shift && (from === found || to === found));
    return { at: 'shift', place, field: shifts[place]?.from === found ? 'from' : 'to' };
  }
  const isName = 'field' in refusal && refusal.field === 'shift name';
  if (!isName) return { at: 'tablet' };
  const place = shifts.findIndex(({ name }) =>
    refusal.code === 'text too long' ? name.length === refusal.length : name === '',
  );
  return { at: 'shift', place, field: 'name' };
}
