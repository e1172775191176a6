import { allTakenOut } from '../batch/apply-trouble.ts';
import { idKey } from '../batch/voids.ts';
import type { Batch, Connector, Happening, Load } from '../batch/types.ts';
import { clockId } from '../timer/clock.ts';
import { stepIdOf } from './step-id.ts';

/** Which clock ran: what its label is made of. */
export type ReviewedClock =
  | { readonly kind: 'cure' | 'wait' | 'polish'; readonly load: string; readonly station: string }
  /** The mix is null where later mixes hide which one it was. */
  | { readonly kind: 'working life'; readonly mix: string | null };

/** How a clock ended, at the moment when a person answered it. */
export interface Lateness {
  readonly clock: ReviewedClock;
  readonly batch: string;
  readonly tag: number;
  /** Id of the step in the batch's recipe. */
  readonly step: string;
  /** How many connectors it was for. */
  readonly connectors: number;
  /** Seconds past the moment when it was due; negative when early. */
  readonly lateS: number;
  readonly verdict: 'in time' | 'early' | 'over';
  readonly reason: string | null;
  /** How late its alarm was seen, in seconds; null where nobody said "seen". */
  readonly seenLateS: number | null;
  /** When it ended. */
  readonly wallMs: number;
}

/** Each ended load and each overrun of a working life, in the order of their end. */
export function latenessOf(batch: Batch): Lateness[] {
  return [...endedLoads(batch), ...overruns(batch)].sort((a, b) => a.wallMs - b.wallMs);
}

function endedLoads(batch: Batch): Lateness[] {
  return batch.loads.flatMap((load) => {
    const step = batch.recipe.steps[load.step];
    if (!load.ended || !step || leftOneByOne(load)) return [];
    if (step.kind !== 'cure' && step.kind !== 'wait' && step.kind !== 'polish') return [];
    return {
      clock: { kind: step.kind, load: load.id, station: load.station },
      batch: batch.id,
      tag: batch.tag,
      step: step.id,
      connectors: load.connectors.length,
      lateS: load.ended.lateS,
      verdict: load.ended.verdict,
      reason: load.ended.reason ?? null,
      seenLateS: seenLateS(batch, clockId(step.kind, load.id, batch.id)),
      wallMs: Math.round(load.ended.at.wall),
    };
  });
}

/** Nobody answered such a clock: its load ended with the last connector sent back or scrapped out of it. */
function leftOneByOne({ ended }: Load): boolean {
  return ended?.reason === allTakenOut && ended.lateS === 0;
}

function seenLateS(batch: Batch, clock: string): number | null {
  return batch.seen[clock]?.lateS ?? null;
}

/** One entry can finish a step for many connectors: that is one overrun. */
function overruns(batch: Batch): Lateness[] {
  const byEntry = new Map<string, Lateness>();
  for (const connector of batch.connectors) {
    for (const happening of connector.history) {
      if (happening.kind !== 'finished' || happening.overrunS === 0) continue;
      const mix = mixOverrun(batch, connector, happening);
      const key = idKey(happening.entry);
      byEntry.set(key, {
        clock: { kind: 'working life', mix },
        batch: batch.id,
        tag: batch.tag,
        step: stepIdOf(batch, happening.step),
        connectors: (byEntry.get(key)?.connectors ?? 0) + 1,
        lateS: happening.overrunS,
        verdict: 'over',
        reason: happening.overrunReason ?? null,
        seenLateS: mix === null ? null : seenLateS(batch, clockId('life', mix, batch.id)),
        wallMs: Math.round(happening.at.wall),
      });
    }
  }
  return [...byEntry.values()];
}

/** The step that was overrun used the mix up, so the last mix seen is the one, unless the connector got another since. */
function mixOverrun(batch: Batch, { history, mixSeen }: Connector, overrun: Happening): string | null {
  const since = history.slice(history.indexOf(overrun) + 1);
  const another = since.some((one) => one.kind === 'finished' && batch.recipe.steps[one.step]?.kind === 'mix');
  return another ? null : mixSeen;
}
