import { createHash } from 'node:crypto';
import { benchOf } from '../../../src/core/event/bench-time.ts';
import { nextTime } from '../../../src/core/event/clock.ts';
import type { Draft, Head, Line } from '../../../src/core/event/entry.ts';
import { hashOfNothing } from '../../../src/core/event/hash.ts';
import { recipeSchema, type Recipe } from '../../../src/core/recipe/schema.ts';
import { courseOf, idMark, courseBatch, type CourseEntry } from './batch-course.ts';
import { chanceFrom } from './chance.ts';

export interface ShopLogOptions {
  /** Texts of the recipes that the shop works by. */
  readonly recipeTexts: readonly string[];
  /** How many entries, within one batch. */
  readonly entries: number;
  /** Batches of 24 that are still open at the end: in the oven, or waiting for their last inspection. */
  readonly open: readonly { readonly id: string; readonly until: 'cure' | 'inspect' }[];
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

interface Course {
  readonly recipe: Recipe;
  readonly entries: readonly CourseEntry[];
}

/** A log of one shop from its first day on: batches that overlap, all decided by the app's rules and chained. */
export function shopLog(options: ShopLogOptions): ShopLog {
  const chance = chanceFrom(options.seed);
  const recipes = options.recipeTexts.map((text) => recipeSchema.parse(JSON.parse(text)));
  // The text that a batch names is the one that travels in the log, so courses are played on that very text.
  const courses = recipes.flatMap((recipe) =>
    [8, 12, 24].map((count): Course => ({ recipe, entries: courseOf(recipe, count, chance) })),
  );
  const large = courses.filter((_, index) => index % 3 === 2);
  const placed: Placed[] = options.open.flatMap(({ id, until }, index) => {
    const course = upTo(chosen(large, index % large.length), until);
    const last = course.at(-1)?.atMs ?? 0;
    return place(course, id, index + 1, options.endWallMs - last - index * 90_000);
  });
  const texts = recipes.map((recipe) => JSON.stringify(recipe));
  const taken = texts.map((text) => benchWide('recipeTaken', { hash: sha256(text), text }));
  const front = [...taken, benchWide('benchSet', { tablet: 'Bench 1', operators: ['MK', 'TO'], shifts: [] })];
  let begun = options.endWallMs - dayMs / 8;
  for (let made = 0; placed.length < options.entries - front.length; made += 1) {
    const course = chosen(courses, Math.floor(chance() * courses.length)).entries;
    const lasts = course.at(-1)?.atMs ?? 0;
    placed.push(...place(course, `made-${made}`, (made % 9) + 4, begun - lasts));
    begun -= everyMs;
  }
  placed.sort((a, b) => a.wall - b.wall);
  const first = placed[0]?.wall ?? options.endWallMs;
  return chained([...front.map((each) => ({ ...each, wall: first - 60_000 })), ...placed]);
}

const benchWide = (type: string, data: object) => ({ batch: 'bench', by: 'MK', type, data: JSON.stringify(data) });

function chosen(courses: readonly Course[], index: number): Course {
  const course = courses[index];
  if (!course) throw new Error('a shop works by at least one recipe');
  return course;
}

function upTo({ recipe, entries }: Course, until: 'cure' | 'inspect'): readonly CourseEntry[] {
  if (until === 'cure') return entries.slice(0, entries.findIndex(({ type }) => type === 'loadStarted') + 1);
  const last = recipe.steps.findLast(({ kind, goes }) => kind === 'inspect' && goes === 'connector by connector');
  // What lags behind is brought up first, so that at the first check of this step all are there.
  const check = entries.findIndex(({ type, data }) => type === 'judged' && data.includes(`"step":"${last?.id}"`));
  return entries.slice(0, check);
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
  let pageBegun = 0;
  for (const each of placed) {
    const page = `page-${Math.floor(each.wall / dayMs)}`;
    if (page !== head?.page) {
      pageBegun = each.wall;
      head = append(lines, head, { ...each, ...pageStart }, page, 0);
    }
    head = append(lines, head, each, page, each.wall - pageBegun);
  }
  if (head === null) throw new Error('a log has at least one entry');
  return { lines, head };
}

const pageStart = { batch: 'bench', by: '', type: 'tabletStarted', data: '{"app":"bench"}' };

function append(lines: Line[], head: Head | null, placed: Placed, page: string, mono: number): Head {
  const { wall, batch, by, type, data } = placed;
  const seq = (head?.seq ?? 0) + 1;
  const time = nextTime(head?.time ?? null, wall);
  const bench = benchOf(head, { type } as Draft, { wall, mono, page });
  const envelope = { log: logId, seq, time, bench, wall, mono, page, offset: 0, zone: 'UTC', by, batch };
  const prev = head?.hash ?? hashOfNothing;
  const front = JSON.stringify({ ...envelope, type, v: 1 }).slice(0, -1);
  const text = `${front},"data":${data},"prev":"${prev}"}`;
  lines.push({ log: logId, seq, batch, text });
  return { log: logId, seq, hash: sha256(text), time, bench, wall, mono, page };
}

const sha256 = (text: string): string => createHash('sha256').update(text).digest('hex');
