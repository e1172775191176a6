import { createHash } from 'node:crypto';
import { benchOf } from '../../../src/core/event/bench-time.ts';
import { nextTime } from '../../../src/core/event/clock.ts';
import type { Draft, Head, Line } from '../../../src/core/event/entry.ts';
import { headAfter } from '../../../src/core/event/line.ts';
import { hashOfNothing } from '../../../src/core/event/hash.ts';
import { recipeSchema } from '../../../src/core/recipe/schema.ts';
import { courseOf, idMark, courseBatch, type CourseEntry } from './batch-course.ts';
import { chanceFrom } from './chance.ts';

export interface ShopLogOptions {
  /** Texts of the recipes that the shop works by. */
  readonly recipeTexts: readonly string[];
  /** How many entries, within one batch. */
  readonly entries: number;
  /** Batches that are still open at the end, and the step that they have come to, by its kind. */
  readonly open: readonly { readonly id: string; readonly until: 'cure' | 'inspect' | 'end' }[];
  /** When the last entry is written, in ms since 1970. */
  readonly endWallMs: number;
  readonly seed: number;
}

export interface ShopLog {
  readonly lines: readonly Line[];
  readonly head: Head;
}

/** A batch is begun every 40 min, so that four or five overlap. */
const everyMs = 40 * 60_000;
const dayMs = 24 * 3_600_000;
const logId = 'shop-log';

interface Placed {
  readonly wall: number;
  readonly batch: string;
  readonly by: string;
  readonly type: string;
  readonly data: string;
}

/** A log of one shop from its first day on: batches that overlap, all decided by the app's rules and chained. */
export function shopLog(options: ShopLogOptions): ShopLog {
  const chance = chanceFrom(options.seed);
  const recipes = options.recipeTexts.map((text) => recipeSchema.parse(JSON.parse(text)));
  // The text that a batch names is the one that travels in the log, so courses are played on that very text.
  const courses = recipes.flatMap((recipe) => [8, 12, 24].map((count) => courseOf(recipe, count, chance)));
  const placed: Placed[] = options.open.flatMap(({ id, until }, index) => {
    const course = upTo(courses[(index * 3 + 2) % courses.length] ?? [], until);
    const last = course.at(-1)?.atMs ?? 0;
    return place(course, id, index + 1, options.endWallMs - last - index * 90_000);
  });
  const head = [...recipes.map((recipe) => wide('recipeTaken', { hash: sha256(JSON.stringify(recipe)), text: JSON.stringify(recipe) })),
    wide('benchSet', { tablet: 'Bench 1', operators: ['MK', 'TO'], shifts: [] })];
  let begun = options.endWallMs - dayMs / 8;
  for (let made = 0; placed.length < options.entries - head.length; made += 1) {
    const course = courses[Math.floor(chance() * courses.length)] ?? [];
    const lasts = course.at(-1)?.atMs ?? 0;
    placed.push(...place(course, `made-${made}`, (made % 9) + 4, begun - lasts));
    begun -= everyMs;
  }
  placed.sort((a, b) => a.wall - b.wall);
  const first = placed[0]?.wall ?? options.endWallMs;
  return chained([...head.map((each) => ({ ...each, wall: first - 60_000 })), ...placed]);
}

const wide = (type: string, data: object) => ({ batch: 'bench', by: 'MK', type, data: JSON.stringify(data) });

function upTo(course: readonly CourseEntry[], until: 'cure' | 'inspect' | 'end'): readonly CourseEntry[] {
  if (until === 'end') return course;
  const cure = course.findIndex(({ type }) => type === 'loadStarted');
  if (until === 'cure') return course.slice(0, cure + 1);
  return course.slice(0, course.findLastIndex(({ type }) => type === 'loadEnded') + 2);
}

function place(course: readonly CourseEntry[], id: string, tag: number, begun: number): Placed[] {
  return course.map(({ atMs, isBenchWide, by, type, data }) => ({
    wall: Math.round(begun + atMs),
    batch: isBenchWide ? 'bench' : courseBatch.replaceAll(idMark, id),
    by,
    type,
    data: (type === 'batchOpened' ? data.replace(/"tag":\d+/, `"tag":${tag}`) : data).replaceAll(idMark, id),
  }));
}

/** Lines as the app writes them: a page a day, each begun by its own entry. */
function chained(placed: readonly Placed[]): ShopLog {
  const lines: Line[] = [];
  let head: Head | null = null;
  let pageBegun = -Infinity;
  const write = ({ wall, batch, by, type, data }: Placed, page: string): Head => {
    const mono = Math.max(0, wall - pageBegun);
    const seq: number = (head?.seq ?? 0) + 1;
    const time = nextTime(head?.time ?? null, wall);
    const bench = benchOf(head, { type } as Draft, { wall, mono, page });
    const envelope = { log: logId, seq, time, bench, wall, mono, page, offset: 0, zone: 'UTC', by, batch, type, v: 1 };
    const prev: string = head?.hash ?? hashOfNothing;
    const text = `${JSON.stringify(envelope).slice(0, -1)},"data":${data},"prev":"${prev}"}`;
    lines.push({ log: logId, seq, batch, text });
    const hashed = { ...headAfter({ ...envelope, prev }, ''), hash: sha256(text) };
    head = hashed;
    return hashed;
  };
  let last: Head | null = null;
  for (const each of placed) {
    const page = `page-${Math.floor(each.wall / dayMs)}`;
    if (page !== head?.page) {
      pageBegun = each.wall;
      write({ ...each, batch: 'bench', by: '', type: 'tabletStarted', data: '{"app":"bench"}' }, page);
    }
    last = write(each, page);
  }
  if (last === null) throw new Error('a log has at least one entry');
  return { lines, head: last };
}

const sha256 = (text: string): string => createHash('sha256').update(text).digest('hex');
