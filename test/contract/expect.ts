/** What a contract needs of a test runner, so that it runs in Vitest and in a page alike. */
export interface Runner {
  test(name: string, run: () => Promise<void>): void;
}

/** As text in which the order of an object's keys does not show. */
function shown(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) =>
    typeof inner === 'object' && inner !== null && !Array.isArray(inner)
      ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inner,
  );
}

export function equal<Value>(actual: Value, expected: Value): void {
  const [is, wanted] = [shown(actual), shown(expected)];
  if (is !== wanted) throw new Error(`expected ${wanted?.slice(0, 400)}, got ${is?.slice(0, 400)}`);
}

/** The error that a promise rejects with; throws where it does not. */
export async function failureOf(promise: Promise<unknown>): Promise<Error> {
  const outcome = await promise.then(
    (value) => new Error(`expected a failure, got ${JSON.stringify(value)}`),
    (error: unknown) => ({ error }),
  );
  if (outcome instanceof Error) throw outcome;
  if (outcome.error instanceof Error) return outcome.error;
  throw new Error(`expected an Error, got ${String(outcome.error)}`);
}
