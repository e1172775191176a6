import { StoreError, type Doing } from './errors.ts';

/** Runs something once after `ms`, unless cancelled by the function that it returns. */
export type After = (ms: number, run: () => void) => () => void;

export const realAfter: After = (ms, run) => {
  const timer = setTimeout(run, ms);
  return () => clearTimeout(timer);
};

/** The promise's own outcome, or a `silent` StoreError where it has none after `ms`. */
export function watched<Value>(promise: Promise<Value>, doing: Doing, ms: number, after: After): Promise<Value> {
  return new Promise((resolve, reject) => {
    const cancel = after(ms, () => reject(new StoreError({ kind: 'silent', doing, waitedMs: ms })));
    promise.then(resolve, reject).finally(cancel);
  });
}
