import type { Batch, Bench } from '../core/batch/types.ts';
import { tagColour } from '../core/recipe/colours.ts';
import { doseNow } from '../core/timer/cure-clock.ts';
import type { Reading } from '../core/timer/reading.ts';
import type { Moment } from '../core/unit/moment.ts';
import type { TagLook } from '../ui/tag-look.ts';
import type { Words } from '../words/index.ts';
import type { GroupView } from './batch-view.ts';
import { countState, countWords, whyWords, type ShowTime } from './clock-words.ts';
import { kindWords } from './kind-words.ts';

export function tagLookOf(tag: number): TagLook {
  const { name, hex, inkHex } = tagColour(tag);
  return { number: tag, name, fill: hex, ink: inkHex };
}

export interface ViewContext {
  readonly bench: Bench;
  readonly now: Moment;
  readonly words: Words;
  readonly time: ShowTime;
}

/** What a batch needs or how it goes, as a technician would say it. */
export function sentenceOf(batch: Batch, view: GroupView | undefined, { bench, words, time }: ViewContext): string {
  const say = words.bench.sentence;
  if (batch.held) return say.held(batch.held.reason);
  if (!view) return say.finished;
  const { step, reading, group } = view;
  const { title } = step.texts.en;
  if (group.at === 'step') {
    if (reading?.state === 'over') return say.workingOver;
    if (reading?.clock.due && step.kind !== 'mix') return `${title}. ${say.working(time(reading.clock.due))}`;
    const open = batch.connectors.filter(({ stands }) => stands.at === 'step' || stands.at === 'load').length;
    return say.toDo(title, group.connectors.length, open);
  }
  if (step.kind === 'cure') {
    if (reading?.state === 'over') return say.cureOver;
    if (reading?.state === 'done') return say.cureDone;
    return say.curing(bench.wide.ovens[group.load.station]?.name ?? '');
  }
  if (step.kind === 'polish') return reading && reading.leftMs <= 0 ? say.polishDone(title) : say.polishing(title);
  return reading?.state === 'done' ? say.waitDone(title) : say.waiting(title);
}

/** The large number of a row and what stands beneath it. */
export function countOf(reading: Reading | null, context: ViewContext) {
  if (!reading) return null;
  const { bench, now, words, time } = context;
  const dose = doseNow(bench, reading.clock, now);
  const { about } = reading.clock;
  const mix = about.type === 'working life' ? bench.wide.mixes[about.mix] : undefined;
  const why =
    dose === null
      ? mix
        ? words.bench.count.mixed(time(mix.mixed), mix.lot)
        : undefined
      : whyWords(dose.why, words, time);
  const note = reading.uncertain ? words.bench.count.uncertain : why;
  return {
    remainingMs: reading.leftMs,
    state: countState(reading),
    text: countWords(reading, dose?.dose ?? null, words, time),
    ...(note === undefined ? {} : { note }),
  };
}

export function noteOf(batch: Batch, words: Words): string {
  return words.bench.note(batch.workOrder, batch.connectors.length, kindWords(batch.recipe, words));
}

/** The hue of a row's edge. */
export function urgencyOf(view: GroupView | undefined): 'none' | 'soon' | 'over' {
  if (!view?.reading) return 'none';
  if (view.reading.state === 'over') return 'over';
  return view.reading.state === 'running' ? 'none' : 'soon';
}
