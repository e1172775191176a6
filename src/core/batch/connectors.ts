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

const passed: Stands = { at: 'passed' };
const places = new WeakMap<Recipe, readonly Stands[]>();

/** Where a connector stands once it is past a step: at the next, or passed. All that stand there share one object. */
export function standsAfter(recipe: Recipe, step: number): Stands {
  let after = places.get(recipe);
  if (!after) {
    after = recipe.steps.slice(1).map((_, index): Stands => ({ at: 'step', step: index + 1 }));
    places.set(recipe, after);
  }
  return after[step] ?? passed;
}

/** The named connectors, or why they cannot be meant. */
export function pick(connectors: readonly OpenConnector[], numbers: readonly number[]): OpenConnector[] | MisfitReason {
  const picked: OpenConnector[] = [];
  let rising = true;
  let last = 0;
  for (const number of numbers) {
    const connector = connectors[number - 1];
    if (!connector) return 'no such connector';
    picked.push(connector);
    rising &&= number > last;
    last = number;
  }
  // Numbers that only rise, as they nearly always do, cannot repeat.
  if (!rising && new Set(numbers).size !== numbers.length) return 'connector named twice';
  return picked;
}

/**
 * When something happened to these connectors, or null where a late entry says a time before what it follows.
 * Two tablets' wall clocks may differ, so an entry made now that seems to lie before is taken as happening then:
 * work is never lost to a clock that is behind.
 */
export function settle(connectors: readonly OpenConnector[], { at, late }: Happened): Moment | null {
  let settled = at;
  for (const { since } of connectors) {
    if (compareMoments(settled, since) >= 0) continue;
    if (late && at.log === since.log) return null;
    settled = since;
  }
  return settled;
}

/** When an entry says that it happened, and whether it was entered later. */
export interface Happened {
  readonly at: Moment;
  readonly late: boolean;
}

/** Moves a connector and remembers why. What moved several at once is one object, which they share. */
export function move(connector: OpenConnector, stands: Stands, happening: Happening): void {
  connector.stands = stands;
  connector.since = happening.at;
  connector.history.push(happening);
}
