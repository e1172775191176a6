import { readFileSync } from 'node:fs';
import { pathToFileURL } from 'node:url';

/*
 * Run by itself, so that nothing else of a measurement lies on the heap: node --expose-gc fold-run.mjs WORK LINES.
 * WORK is the bundled fold-work module, LINES a file of one line of a log each. Prints the figures as JSON.
 */

const rounds = 9;
const warmUp = 2;

const [workPath = '', linesPath = ''] = process.argv.slice(2);
/** @type {typeof import('./fold-work.ts')} */
const work = await import(pathToFileURL(workPath).href);
const texts = readFileSync(linesPath, 'utf8').trimEnd().split('\n');

/**
 * In processor time, that of clearing away garbage included: what others do on the machine at the same time is no part
 * of either, and waiting for it made the ratio swing by half.
 * @template Made
 * @param {() => Made} make
 * @returns {{ ms: number, made: Made }}
 */
function timed(make) {
  // Garbage of one is not cleared away in the time of the other.
  globalThis.gc?.();
  const begun = process.cpuUsage();
  const made = make();
  const { user, system } = process.cpuUsage(begun);
  return { ms: (user + system) / 1000, made };
}

const batches = work.checkedFold(texts);
/** @type {{ subject: number, floor: number }[]} */
const folded = [];
/** @type {{ subject: number, floor: number }[]} */
const checked = [];
for (let round = -warmUp; round < rounds; round += 1) {
  const floor = timed(() => work.parseOnly(texts));
  // Entries just parsed, as a start has them: nothing about their texts is remembered yet.
  const fold = timed(() => work.fold(floor.made));
  if (round >= 0) folded.push({ subject: fold.ms, floor: floor.ms });
  if (round % 3 === 0) checked.push({ subject: timed(() => work.parseWithCheck(texts)).ms, floor: floor.ms });
}
process.stdout.write(JSON.stringify({ entries: texts.length, batches, folded, checked }));
