import type { Recipe } from '../recipe/schema.ts';
import { compareMoments, type Moment } from '../unit/moment.ts';
import type { MisfitReason } from './misfit-reasons.ts';
import type { MutableTop } from './mutable.ts';
import type { Connector, Happening, Stands } from './types.ts';

export type OpenConnector = MutableTop<Connector>;

/** Whether the connector has neither passed nor been scrapped. */
export function unfinished(connector: Connector): boolean {
  return connector.stands.at === 'step' || connector.stands.at === 'load';
}

/** The step that an unfinished or scrapped connector belongs to; null once passed. */
export function stepOf(connector: Connector): number | null {
  return connector.stands.at === 'passed' ? null : connector.stands.step;
}

/** Where a connector stands once it is past a step: at the next, or passed. */
export function standsAfter(recipe: Recipe, step: number): Stands {
  return step + 1 < recipe.steps.length ? { at: 'step', step: step + 1 } : { at: 'passed' };
}

/** The named connectors, or why they cannot be meant. */
export function pick(connectors: readonly OpenConnector[], numbers: readonly number[]): OpenConnector[] | MisfitReason {
  const picked: OpenConnector[] = [];
  for (const number of numbers) {
    const connector = connectors[number - 1];
    if (!connector) return 'no such connector';
    picked.push(connector);
  }
  if (numbers.length > 1 && new Set(numbers).size !== numbers.length) return 'connector named twice';
  return picked;
}

/**
 * When something happened to these connectors, or null where that would be before what it follows.
 * Across logs only wall clocks compare, which may differ: there the later of the two is taken.
 */
export function settle(connectors: readonly OpenConnector[], at: Moment): Moment | null {
  let settled = at;
  for (const { since } of connectors) {
    if (compareMoments(settled, since) >= 0) continue;
    if (settled.log === since.log) return null;
    settled = { ...settled, bench: settled.bench + (since.wall - settled.wall), wall: since.wall };
  }
  return settled;
}

/** Moves a connector and remembers why. */
export function move(connector: OpenConnector, stands: Stands, happening: Happening): void {
  connector.stands = stands;
  connector.since = happening.at;
  connector.history.push(happening);
}
