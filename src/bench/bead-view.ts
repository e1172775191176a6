import { jacketColours } from '../core/recipe/colours.ts';
import { isTimed } from '../core/recipe/read.ts';
import type { Step } from '../core/recipe/schema.ts';
import type { Batch } from '../core/batch/types.ts';
import { stepOf } from '../core/batch/connectors.ts';
import type { Reading } from '../core/timer/reading.ts';
import type { Bead, BeadState } from '../ui/fibre-line-layout.ts';
import type { Words } from '../words/index.ts';
import type { GroupView } from './batch-view.ts';

/** Seconds that a step's long bead stands for; 0 where a step has no time of its own. */
function lengthS(step: Step, batch: Batch): number {
  if (step.kind === 'wait') return step.atLeastS;
  if (step.kind === 'cure') return (batch.recipe.adhesive.curePairs[0]?.minutes ?? 20) * 60;
  return 0;
}

/** A film is as short as the work around it: it stays a bead. */
const isLong = (step: Step): boolean => step.kind === 'cure' || step.kind === 'wait';

/** The fibre line of a batch: every occupied step ringed, with its count where there are several. */
export function beadsOf(batch: Batch, groups: readonly GroupView[]): Bead[] {
  const earliest = batch.connectors.reduce((least, connector) => {
    const step = stepOf(connector);
    return connector.stands.at === 'scrapped' || step === null ? least : Math.min(least, step);
  }, batch.recipe.steps.length);
  return batch.recipe.steps.map((step, index): Bead => {
    const here = groups.filter(({ group }) => group.step === index);
    const count = here.reduce((sum, { group }) => sum + group.connectors.length, 0);
    const reading = here.find((view) => view.reading)?.reading ?? null;
    const bead = {
      kind: isLong(step) ? ('timed' as const) : ('step' as const),
      share: lengthS(step, batch),
      label: step.texts.en.label,
    };
    if (here.length === 0) return { ...bead, state: index < earliest ? 'done' : 'to do' };
    const running = here.some(({ group }) => group.at === 'load') && isTimed(step);
    return { ...bead, state: stateOf(reading, running), count, progress: running ? (reading?.share ?? 0) : undefined };
  });
}

function stateOf(reading: Reading | null, running: boolean): BeadState {
  if (reading?.state === 'over') return 'over';
  if (!running) return 'current';
  return reading?.state === 'done' ? 'waiting' : 'running';
}

export function lineOf(batch: Batch, groups: readonly GroupView[], words: Words, name: string) {
  return {
    name,
    jacket: jacketColours[batch.recipe.fits.jacketColour].hex,
    tipAngleDeg: batch.recipe.fits.angleDeg,
    beads: beadsOf(batch, groups),
    overWord: words.bench.overWord,
  };
}
