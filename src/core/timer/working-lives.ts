import { stepIndexIn } from '../batch/open-batch.ts';
import type { Batch, BenchWide, Mix } from '../batch/types.ts';
import type { Recipe } from '../recipe/schema.ts';

/** A mix that some connectors of a batch still have to use up. */
export interface RunningLife {
  readonly mix: Mix;
  readonly connectors: number;
  /** Index of the mix step, and of the step that must be finished before the working life is over. */
  readonly step: number;
  readonly limitStep: number;
}

/** The mixes that limit a batch now, in the order of its connectors. A mix that nobody entered limits nothing. */
export function workingLives(wide: BenchWide, batch: Batch): readonly RunningLife[] {
  const lives = new Map<string, RunningLife>();
  for (const connector of batch.connectors) {
    const { mix: id, stands } = connector;
    if (id === null) continue;
    const known = lives.get(id);
    if (known) {
      lives.set(id, { ...known, connectors: known.connectors + 1 });
      continue;
    }
    const mix = wide.mixes[id];
    const mixStep = mixStepBefore(batch.recipe, 'step' in stands ? stands.step : 0);
    if (mix && mixStep) lives.set(id, { mix, connectors: 1, ...mixStep });
  }
  return [...lives.values()];
}

/** The mix step that a connector standing at a step comes from: the last one before it. */
function mixStepBefore(recipe: Recipe, standing: number): { step: number; limitStep: number } | null {
  for (let step = Math.min(standing, recipe.steps.length - 1); step >= 0; step -= 1) {
    const candidate = recipe.steps[step];
    if (candidate?.kind === 'mix') return { step, limitStep: stepIndexIn(recipe, candidate.limits) };
  }
  return null;
}
