/** Real work, or a demo shift with invented data: each has a database of its own, so they never mix. */
export type Mode =
  | { readonly kind: 'real'; readonly database: 'lintfree' }
  | { readonly kind: 'demo'; readonly database: 'lintfree-demo' };

const key = 'lintfree-bench';

export function readMode(storage: Pick<Storage, 'getItem'>): Mode {
  return storage.getItem(key) === 'demo'
    ? { kind: 'demo', database: 'lintfree-demo' }
    : { kind: 'real', database: 'lintfree' };
}

export function writeMode(storage: Pick<Storage, 'setItem' | 'removeItem'>, kind: Mode['kind']): void {
  if (kind === 'demo') storage.setItem(key, 'demo');
  else storage.removeItem(key);
}
