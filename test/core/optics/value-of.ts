import type { Result } from '../../../src/core/unit/result.ts';

/** The value of a result that a test knows to be good. */
export function valueOf<Value, Problem>(result: Result<Value, Problem>): Value {
  if (!result.ok) throw new Error(`refused: ${JSON.stringify(result.error)}`);
  return result.value;
}

/** The refusal of a result that a test knows to be refused. */
export function refusalOf<Value, Problem>(result: Result<Value, Problem>): Problem {
  if (result.ok) throw new Error(`not refused: ${JSON.stringify(result.value)}`);
  return result.error;
}
