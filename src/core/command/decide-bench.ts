import type { Bench } from '../batch/types.ts';
import { benchWide, type Draft } from '../event/entry.ts';
import { ok } from '../unit/result.ts';
import type { Command } from './commands.ts';
import { refuse, requiredText, whenHappened, type Context, type Decision } from './context.ts';
import { checkTemperature, mostWarmUpS, ovenRangeC } from './ranges.ts';

type Of<Type extends Command['type']> = Extract<Command, { type: Type }>;

const initialsForm = /^\p{L}[\p{L}\p{N}]{0,3}$/u;
const clockForm = /^([01]\d|2[0-3]):[0-5]\d$/;
const longestName = 80;
/** As many as an entry can hold. */
export const mostOperators = 40;
export const mostShifts = 6;
/** The longest time that a tablet is believed to have been off, in seconds: 30 days. */
export const mostStatedS = 30 * 86400;

export function decideSetBench(command: Of<'set bench'>): Decision {
  const tablet = requiredText(command.tablet, 'tablet name', longestName);
  if (!tablet.ok) return tablet;
  const operators = command.operators.map((initials) => initials.trim());
  for (const found of operators) if (!initialsForm.test(found)) return refuse({ code: 'initials unfit', found });
  const twice = operators.find((found, index) => operators.indexOf(found) !== index);
  if (twice !== undefined) return refuse({ code: 'initials twice', found: twice });
  if (operators.length > mostOperators) return refuse({ code: 'too many', what: 'operators', most: mostOperators });
  if (command.shifts.length > mostShifts) return refuse({ code: 'too many', what: 'shifts', most: mostShifts });
  const shifts = [];
  for (const shift of command.shifts) {
    const name = requiredText(shift.name, 'shift name', longestName);
    if (!name.ok) return name;
    for (const found of [shift.from, shift.to]) {
      if (!clockForm.test(found)) return refuse({ code: 'shift time unfit', shift: name.value, found });
    }
    shifts.push({ name: name.value, from: shift.from, to: shift.to });
  }
  return ok([{ batch: benchWide, type: 'benchSet', v: 1, data: { tablet: tablet.value, operators, shifts } }]);
}

export function decideSignOn(bench: Bench, command: Of<'sign on'>): Decision {
  const { operator, shift } = command;
  if (!bench.wide.operators.includes(operator)) return refuse({ code: 'operator unknown', operator });
  return ok([{ batch: benchWide, type: 'shiftChanged', v: 1, data: { operator, shift } }]);
}

export function decideSetOven(command: Of<'set oven'>, context: Context): Decision {
  const name = requiredText(command.name, 'oven name', longestName);
  if (!name.ok) return name;
  const unfit = checkTemperature(command.setPointC, ovenRangeC);
  if (unfit) return refuse(unfit);
  const { oven, setPointC, warmUpS } = command;
  if (warmUpS !== null && !(warmUpS >= 0 && warmUpS <= mostWarmUpS)) {
    return refuse({ code: 'warm-up out of range', found: warmUpS, mostS: mostWarmUpS });
  }
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  const data = { oven, name: name.value, setPointC, warmUpS, ...when.value.data };
  return ok([{ batch: benchWide, type: 'ovenSet', v: 1, data }]);
}

export function decideReadOven(bench: Bench, command: Of<'read oven'>, context: Context): Decision {
  if (!bench.wide.ovens[command.oven]) return refuse({ code: 'oven unknown' });
  const unfit = checkTemperature(command.temperatureC, ovenRangeC);
  if (unfit) return refuse(unfit);
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  const data = { oven: command.oven, temperatureC: command.temperatureC, ...when.value.data };
  return ok([{ batch: benchWide, type: 'ovenRead', v: 1, data }]);
}

export function decideDisturbOven(bench: Bench, command: Of<'disturb oven'>, context: Context): Decision {
  if (!bench.wide.ovens[command.oven]) return refuse({ code: 'oven unknown' });
  const when = whenHappened(context.now, command.late);
  if (!when.ok) return when;
  const data = { oven: command.oven, what: command.what, ...when.value.data };
  return ok([{ batch: benchWide, type: 'ovenDisturbed', v: 1, data }]);
}

export function decideStateTime(command: Of<'state time'>): Decision {
  if (!(command.addedS >= 0 && command.addedS <= mostStatedS)) {
    return refuse({ code: 'time out of range', mostS: mostStatedS });
  }
  return ok([{ batch: benchWide, type: 'timeStated', v: 1, data: { addedS: command.addedS } }]);
}

export function decideSeeClock(bench: Bench, command: Of<'see clock'>): Decision {
  const { batch, clock, lateS } = command;
  if (batch !== benchWide && !bench.batches[batch]) return refuse({ code: 'batch unknown', batch });
  const draft: Draft = { batch, type: 'clockSeen', v: 1, data: { clock, lateS: Math.round(lateS) } };
  return ok([draft]);
}
