import type { Entry, EntryId } from '../event/entry.ts';

export const idKey = (id: EntryId): string => `${id.log} ${id.seq}`;

/**
 * The entries that are taken back by a later one. Gathered before the fold, so that arrival order is of no account.
 * A void cannot be voided: to take it back, enter again what it took away.
 */
export function voidedIds(entries: readonly Entry[]): ReadonlySet<string> {
  const voided = new Set<string>();
  let voids: Set<string> | null = null;
  for (const entry of entries) {
    if (entry.type !== 'voided') continue;
    for (const target of entry.data.targets) voided.add(idKey(target));
    (voids ??= new Set()).add(idKey(entry));
  }
  if (voids) for (const id of voids) voided.delete(id);
  return voided;
}

/** The entries that still count: neither voids nor voided, in the order given. */
export function standing(entries: readonly Entry[]): readonly Entry[] {
  const voided = voidedIds(entries);
  if (voided.size === 0 && !entries.some((entry) => entry.type === 'voided')) return entries;
  return entries.filter((entry) => entry.type !== 'voided' && !voided.has(idKey(entry)));
}
