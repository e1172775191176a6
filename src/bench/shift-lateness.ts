import type { Lateness } from '../core/review/lateness.ts';
import type { TagLook } from '../ui/tag-look.ts';
import { span, timeOfDay } from '../words/format.ts';
import type { Words } from '../words/index.ts';
import { tagLookOf } from './row-view.ts';
import type { ShiftContext } from './shift-view.ts';

/** One ended clock in words. */
export interface LatenessView {
  readonly key: string;
  readonly tag: TagLook;
  readonly batch: string;
  readonly time: string;
  readonly title: string;
  /** How it ended and how its alarm was seen. */
  readonly text: string;
  readonly reason: string | null;
  readonly verdict: Lateness['verdict'];
}

type Batches = ReadonlyMap<string, { readonly hash: string; readonly workOrder: string }>;

export function latenessViews(lateness: readonly Lateness[], batches: Batches, context: ShiftContext): LatenessView[] {
  const { words, offsetMinutesAt } = context;
  const say = words.shift.lateness;
  return lateness.map((late, index) => ({
    key: `${late.batch} ${index}`,
    tag: tagLookOf(late.tag),
    batch: late.batch,
    time: timeOfDay(late.wallMs, offsetMinutesAt(late.wallMs)),
    title: [
      clockWords(late, batches, context),
      batches.get(late.batch)?.workOrder ?? '',
      say.connectors(late.connectors),
    ]
      .filter((part) => part !== '')
      .join(' · '),
    text: [howWords(late, words), seenWords(late, words)].filter((part) => part !== '').join('; '),
    reason: late.reason === null ? null : say.reason(late.reason),
    verdict: late.verdict,
  }));
}

function clockWords(late: Lateness, batches: Batches, { wide, words }: ShiftContext): string {
  const recipe = wide.recipes[batches.get(late.batch)?.hash ?? '']?.recipe;
  const step = recipe?.steps.find(({ id }) => id === late.step)?.texts.en.title ?? late.step;
  const station = late.clock.kind === 'cure' ? (wide.ovens[late.clock.station]?.name ?? '') : '';
  return words.shift.lateness.clock(late.clock.kind, step, station);
}

/** Lateness of under a second is none. */
function howWords({ lateS, verdict, clock }: Lateness, words: Words): string {
  const say = words.shift.lateness;
  const away = span(lateS * 1000);
  if (verdict === 'early') return say.early(away);
  if (verdict === 'over') return clock.kind === 'working life' ? say.overrun(away) : say.over(away);
  return lateS < 1 ? say.onTime : say.late(away);
}

function seenWords({ seenLateS }: Lateness, words: Words): string {
  if (seenLateS === null) return '';
  return seenLateS < 1 ? words.shift.lateness.seenAtOnce : words.shift.lateness.seen(span(seenLateS * 1000));
}
