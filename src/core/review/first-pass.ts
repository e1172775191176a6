import type { Connector } from '../batch/types.ts';

/** How often a connector was sent back and kept its connector part, over all its attempts. */
export function reworksOf(connector: Connector): number {
  let reworks = 0;
  for (const happening of connector.history) {
    if (happening.kind === 'sent back' && happening.attempt === 'same') reworks += 1;
  }
  return reworks;
}

/**
 * First pass: passed at attempt one with nothing sent back. A re-terminated connector is the same connector's next
 * attempt, never a new one, so it cannot come to count as right first time.
 */
export function isFirstPass(connector: Connector): boolean {
  return connector.stands.at === 'passed' && !connector.history.some(({ kind }) => kind === 'sent back');
}
