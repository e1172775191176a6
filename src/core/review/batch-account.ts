import { unfinished } from '../batch/connectors.ts';
import type { Batch, Connector } from '../batch/types.ts';
import { cycleOf, type CycleParts } from './cycle.ts';
import { reworksOf } from './first-pass.ts';
import { latenessOf, type Lateness } from './lateness.ts';
import { stepIdOf } from './step-id.ts';

export interface RecipeKey {
  readonly id: string;
  readonly revision: string;
  /** SHA-256 of the recipe's text: what the batch was really made by. */
  readonly hash: string;
}

/** A connector that passed or was scrapped. */
export type FinishedConnector = CycleParts & {
  readonly number: number;
  readonly attempt: number;
  readonly firstPass: boolean;
  /** Times sent back without a new connector part, over all attempts. */
  readonly reworks: number;
  readonly finishedWallMs: number;
  /** The times rest on two tablets' wall clocks. */
  readonly acrossClocks: boolean;
} & ({ readonly outcome: 'passed'; readonly defect: null } | { readonly outcome: 'scrapped'; readonly defect: string });

/** Connectors that were sent back or scrapped for one cause, at one step, at one moment. */
export interface DefectCount {
  readonly kind: 'sent back' | 'scrapped';
  readonly defect: string;
  /** Id of the step at which it was found. */
  readonly step: string;
  readonly wallMs: number;
  readonly connectors: number;
}

/** What a batch, open or closed, adds to a review. */
export interface BatchAccount {
  readonly batch: string;
  readonly tag: number;
  readonly workOrder: string;
  readonly recipe: RecipeKey;
  readonly openedWallMs: number;
  readonly connectors: readonly FinishedConnector[];
  readonly defects: readonly DefectCount[];
  readonly lateness: readonly Lateness[];
}

export function accountOf(batch: Batch): BatchAccount {
  return {
    batch: batch.id,
    tag: batch.tag,
    workOrder: batch.workOrder,
    recipe: { id: batch.recipe.id, revision: batch.recipe.revision, hash: batch.recipeHash },
    openedWallMs: Math.round(batch.opened.wall),
    connectors: batch.connectors.flatMap((connector) => finishedConnector(batch, connector) ?? []),
    defects: defectsOf(batch),
    lateness: latenessOf(batch),
  };
}

export function unfinishedIn(batch: Batch): number {
  let count = 0;
  for (const connector of batch.connectors) if (unfinished(connector)) count += 1;
  return count;
}

function finishedConnector(batch: Batch, connector: Connector): FinishedConnector | null {
  const { stands } = connector;
  if (stands.at !== 'passed' && stands.at !== 'scrapped') return null;
  const { finishedAt: _sameAsSince, ...cycle } = cycleOf(batch, connector);
  return {
    number: connector.number,
    ...(stands.at === 'passed' ? { outcome: 'passed', defect: null } : { outcome: 'scrapped', defect: stands.defect }),
    reworks: reworksOf(connector),
    finishedWallMs: Math.round(connector.since.wall),
    ...cycle,
  };
}

function defectsOf(batch: Batch): DefectCount[] {
  const counts = new Map<string, DefectCount>();
  for (const { history } of batch.connectors) {
    for (const happening of history) {
      if (happening.kind !== 'sent back' && happening.kind !== 'scrapped') continue;
      const { kind, defect } = happening;
      const step = stepIdOf(batch, kind === 'sent back' ? happening.from : happening.step);
      const wallMs = Math.round(happening.at.wall);
      const key = JSON.stringify([kind, defect, step, wallMs]);
      counts.set(key, { kind, defect, step, wallMs, connectors: (counts.get(key)?.connectors ?? 0) + 1 });
    }
  }
  return [...counts.values()].sort((a, b) => a.wallMs - b.wallMs);
}
