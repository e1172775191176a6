/** The outcome of something the user can act on: a value, or an error that is data. */
export type Result<Value, Problem> = { ok: true; value: Value } | { ok: false; error: Problem };

export const ok = <Value>(value: Value): { ok: true; value: Value } => ({ ok: true, value });

export const failed = <Problem>(error: Problem): { ok: false; error: Problem } => ({ ok: false, error });
