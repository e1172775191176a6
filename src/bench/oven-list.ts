import type { Batch, Bench, Oven, OvenHappening } from '../core/batch/types.ts';
import { idKey, voidedIds } from '../core/batch/voids.ts';
import { benchWide, type EntryId } from '../core/event/entry.ts';
import type { TagLook } from '../ui/tag-look.ts';
import { decimals } from '../words/format.ts';
import type { Words } from '../words/index.ts';
import type { ShowTime } from './clock-words.ts';
import { tagLookOf } from './row-view.ts';

export interface OvenLoad {
  readonly tag: TagLook;
  readonly batch: string;
  readonly connectors: number;
}

/** One oven as its card shows it. */
export interface OvenCard {
  readonly oven: Oven;
  /** "Set to 100 °C, warm-up 12 min". */
  readonly setting: string;
  /** "Read 98 °C at 10:14". */
  readonly reading: string;
  /** What a person must do about it, if anything. */
  readonly wants: string | null;
  readonly loads: readonly OvenLoad[];
}

interface OvenContext {
  readonly bench: Bench;
  readonly words: Words;
  readonly time: ShowTime;
}

/** All ovens by name. One whose every entry was taken back is gone. */
export function ovenCards({ bench, words, time }: OvenContext): OvenCard[] {
  const open = Object.values(bench.batches).filter((batch) => !batch.closed);
  return Object.values(bench.wide.ovens)
    .filter(({ history }) => history.length > 0)
    .sort((a, b) => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0))
    .map((oven) => ({
      oven,
      setting: settingWords(oven, words, time),
      reading: readingWords(oven, words, time),
      wants: wantsWords(oven, words, time),
      loads: loadsIn(oven, open),
    }));
}

type Of<Kind extends OvenHappening['kind']> = Extract<OvenHappening, { kind: Kind }>;

function lastOf<Kind extends OvenHappening['kind']>(oven: Oven, kind: Kind): Of<Kind> | undefined {
  return oven.history.findLast((happening): happening is Of<Kind> => happening.kind === kind);
}

/** The setting in force: what "set it anew" begins from. */
export function lastSetting(oven: Oven): Of<'set'> | undefined {
  return lastOf(oven, 'set');
}

function settingWords(oven: Oven, words: Words, time: ShowTime): string {
  const say = words.ovens;
  const set = lastSetting(oven);
  if (!set) return say.unset;
  const warmUp = set.warmUpS === null ? say.notMeasured : say.warmUp(decimals(set.warmUpS / 60, 1));
  return [say.setPoint(decimals(set.setPointC, 1)), warmUp, say.setAt(time(set.at))].join(', ');
}

function readingWords(oven: Oven, words: Words, time: ShowTime): string {
  const read = lastOf(oven, 'read');
  return read ? words.ovens.read(decimals(read.temperatureC, 1), time(read.at)) : words.ovens.neverRead;
}

/** A power cut lasts until the oven is set anew, an opened door until a reading or a setting. */
function wantsWords(oven: Oven, words: Words, time: ShowTime): string | null {
  const sinceSet = oven.history.slice(oven.history.findLastIndex(({ kind }) => kind === 'set') + 1);
  const cut = sinceSet.findLast(({ kind }) => kind === 'power cut');
  if (cut) return words.ovens.powerCut(time(cut.at));
  const last = oven.history.at(-1);
  return last?.kind === 'door opened' ? words.ovens.doorOpened(time(last.at)) : null;
}

function loadsIn(oven: Oven, open: readonly Batch[]): OvenLoad[] {
  return open
    .flatMap((batch) =>
      batch.loads
        .filter(({ station, ended, connectors }) => station === oven.id && ended === null && connectors.length > 0)
        .map(({ connectors }) => ({ tag: batch.tag, batch: batch.id, connectors: connectors.length })),
    )
    .sort((a, b) => a.tag - b.tag)
    .map(({ tag, ...load }) => ({ ...load, tag: tagLookOf(tag) }));
}

export interface OvenUndo {
  readonly entry: EntryId;
  readonly label: string;
}

/** The latest entry about an oven since the page was loaded that still stands; null where there is none. */
export function ovenUndo(bench: Bench, words: Words): OvenUndo | null {
  const entries = bench.entries[benchWide] ?? [];
  const gone = voidedIds(entries);
  const say = words.ovens.undo;
  const nameOf = (oven: string): string => bench.wide.ovens[oven]?.name ?? oven;
  for (const entry of entries.toReversed()) {
    if (gone.has(idKey(entry))) continue;
    const { log, seq } = entry;
    switch (entry.type) {
      case 'ovenSet':
        return { entry: { log, seq }, label: say.set(nameOf(entry.data.oven)) };
      case 'ovenRead': {
        const { oven, temperatureC } = entry.data;
        return { entry: { log, seq }, label: say.read(nameOf(oven), decimals(temperatureC, 1)) };
      }
      case 'ovenDisturbed':
        return { entry: { log, seq }, label: say[entry.data.what](nameOf(entry.data.oven)) };
      default:
    }
  }
  return null;
}
