import type { Bench } from '../batch/types.ts';
import { benchWide, type Draft } from '../event/entry.ts';
import { sha256 } from '../event/hash.ts';
import { readRecipe } from '../recipe/parse.ts';
import { ok, type Result } from '../unit/result.ts';
import type { Command, NamedConnector } from './commands.ts';
import { refuse, type Decision } from './context.ts';
import type { Refusal } from './refusal.ts';

type Of<Type extends Command['type']> = Extract<Command, { type: Type }>;

export const mostConnectors = 1000;
export const longestWorkOrder = 80;
export const longestSerial = 40;
/** As many as TIA-598 has colours. */
export const tagCount = 12;

/** The tags that open batches wear, but for one of them. */
export function tagsTaken(bench: Bench, except?: string): ReadonlySet<number> {
  return new Set(
    Object.values(bench.batches)
      .filter((batch) => !batch.closed && batch.id !== except)
      .map((batch) => batch.tag),
  );
}

export function firstFreeTag(bench: Bench): number | null {
  const taken = tagsTaken(bench);
  for (let tag = 1; tag <= tagCount; tag += 1) if (!taken.has(tag)) return tag;
  return null;
}

export function decideOpenBatch(bench: Bench, command: Of<'open batch'>): Decision {
  if (bench.batches[command.batch]) return refuse({ code: 'batch exists' });
  const workOrder = command.workOrder.trim();
  if (workOrder === '') return refuse({ code: 'work order empty' });
  const length = workOrder.length;
  if (length > longestWorkOrder) {
    return refuse({ code: 'text too long', field: 'work order', length, most: longestWorkOrder });
  }
  const found = command.connectors.length;
  if (found < 1 || found > mostConnectors) {
    return refuse({ code: 'connectors out of range', found, most: mostConnectors });
  }
  const serials = checkSerials(command.connectors);
  if (serials) return refuse(serials);
  const tag = command.tag ?? firstFreeTag(bench);
  if (tag === null) return refuse({ code: 'no tag free' });
  if (tagsTaken(bench).has(tag)) return refuse({ code: 'tag taken', tag });
  const taken = takeRecipe(bench, command.recipeText);
  if (!taken.ok) return taken;
  const opened: Draft = {
    batch: command.batch,
    type: 'batchOpened',
    v: 1,
    data: { tag, workOrder, recipe: taken.value.hash, connectors: command.connectors.map((one) => ({ ...one })) },
  };
  return ok([...taken.value.drafts, opened]);
}

function checkSerials(connectors: readonly NamedConnector[]): Refusal | null {
  const seen = new Set<string>();
  for (const { serial } of connectors) {
    if (serial === undefined) continue;
    if (serial.length > longestSerial) {
      return { code: 'text too long', field: 'serial', length: serial.length, most: longestSerial };
    }
    if (seen.has(serial)) return { code: 'serial twice', serial };
    seen.add(serial);
  }
  return null;
}

/** The entry that takes a recipe's whole text into use, or none where this revision is in use already. */
export function takeRecipe(bench: Bench, text: string): Result<{ hash: string; drafts: Draft[] }, Refusal> {
  const hash = sha256(text);
  if (bench.wide.recipes[hash]) return ok({ hash, drafts: [] });
  const read = readRecipe(text);
  if (!read.ok) return refuse({ code: 'recipe not usable', problems: read.error });
  return ok({ hash, drafts: [{ batch: benchWide, type: 'recipeTaken', v: 1, data: { hash, text } }] });
}

export function decideTakeRecipe(bench: Bench, command: Of<'take recipe'>): Decision {
  const taken = takeRecipe(bench, command.recipeText);
  return taken.ok ? ok(taken.value.drafts) : taken;
}
