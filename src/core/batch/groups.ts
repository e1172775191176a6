import type { Batch, Connector, Load } from './types.ts';

/** Connectors that stand together: at one step, or in one load. */
export type Group = { readonly step: number; readonly connectors: readonly Connector[] } & (
  { readonly at: 'step' } | { readonly at: 'load'; readonly load: Load }
);

/** Where a batch's unfinished connectors stand, the earliest step first; at one step, what is in no load first. */
export function groupsOf(batch: Batch): Group[] {
  const steps = new Map<number, Connector[]>();
  const loads = new Map<string, Connector[]>();
  for (const connector of batch.connectors) {
    const { stands } = connector;
    if (stands.at === 'step') add(steps, stands.step, connector);
    if (stands.at === 'load') add(loads, stands.load, connector);
  }
  const waiting = [...steps].map(([step, connectors]): Group => ({ at: 'step', step, connectors }));
  const loaded = batch.loads.flatMap((load): Group[] => {
    const connectors = loads.get(load.id);
    return connectors ? [{ at: 'load', load, step: load.step, connectors }] : [];
  });
  return [...waiting, ...loaded].sort((a, b) => a.step - b.step);
}

function add<Key>(groups: Map<Key, Connector[]>, key: Key, connector: Connector): void {
  const group = groups.get(key);
  if (group) group.push(connector);
  else groups.set(key, [connector]);
}

export function groupKey(group: Group): string {
  return group.at === 'load' ? `load ${group.load.id}` : `step ${group.step}`;
}
