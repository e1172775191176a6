import { readFile, stat } from 'node:fs/promises';
import { recipeJsonSchema } from '../core/recipe/json-schema.ts';
import { longestRecipe, readRecipe } from '../core/recipe/parse.ts';
import { problemLine } from '../core/recipe/problem.ts';
import { failed, ok, type Result } from '../core/unit/result.ts';

const usage = `Checks recipe files: their shape and what they mean.
  npm run recipes -- FILE...     prints "FILE: ok", or each problem: file, path inside it, expected, found
  npm run recipes -- --schema    prints the JSON Schema of a recipe, for editors
Exit code 0: all are ok. 1: a problem in any. 2: called wrongly.`;

/** Problems of one file that are printed; the rest is counted. */
const mostPrinted = 50;
/** UTF-8 takes at most three bytes for one UTF-16 code unit. */
const longestBytes = longestRecipe * 3;

const reasons: Readonly<Record<string, string>> = {
  ENOENT: 'there is no such file',
  EACCES: 'this user may not read it',
  EISDIR: 'it is a folder, not a file',
};

async function readText(file: string): Promise<Result<string, string>> {
  try {
    const facts = await stat(file);
    if (facts.isDirectory()) return failed('it is a folder, not a file');
    if (!facts.isFile()) return failed('it is not an ordinary file');
    if (facts.size > longestBytes) return failed(`it has ${facts.size} bytes; a recipe has at most ${longestBytes}`);
    return ok(new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(await readFile(file)));
  } catch (error) {
    if (error instanceof TypeError) return failed('it is not UTF-8 text');
    const code = error instanceof Error && 'code' in error ? String(error.code) : '';
    return failed(reasons[code] ?? `reading it failed (${code || 'unknown reason'})`);
  }
}

/** The lines to print for one file, and whether it is a good recipe. */
async function checkFile(file: string): Promise<{ good: boolean; lines: string[] }> {
  const text = await readText(file);
  if (!text.ok) return { good: false, lines: [`${file}: cannot be read: ${text.error}.`] };
  const recipe = readRecipe(text.value);
  if (recipe.ok) return { good: true, lines: [`${file}: ok`] };
  const lines = recipe.error.slice(0, mostPrinted).map((problem) => problemLine(file, problem));
  const more = recipe.error.length - lines.length;
  return { good: false, lines: more > 0 ? [...lines, `${file}: and ${more} more problems`] : lines };
}

/** Checks the named recipe files and prints what it finds; answers the exit code. */
export async function main(args: string[]): Promise<number> {
  if (args.length === 1 && args[0] === '--schema') {
    process.stdout.write(recipeJsonSchema());
    return 0;
  }
  if (args.length === 1 && args[0] === '--help') {
    console.log(usage);
    return 0;
  }
  if (args.length === 0 || args.some((arg) => arg.startsWith('-'))) {
    console.error(usage);
    return 2;
  }
  let allGood = true;
  for (const file of args) {
    const { good, lines } = await checkFile(file);
    allGood &&= good;
    console.log(lines.join('\n'));
  }
  return allGood ? 0 : 1;
}
