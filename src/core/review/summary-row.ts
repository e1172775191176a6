import type { Batch } from '../batch/types.ts';
import { accountOf, type BatchAccount } from './batch-account.ts';

/** Rises whenever the fold or this row would give other numbers for the same entries; older rows are made anew. */
export const summaryVersion = 1;

/** What a closed batch leaves behind, as plain JSON: enough for every review without its entries. */
export interface SummaryRow extends BatchAccount {
  readonly version: typeof summaryVersion;
  readonly closedWallMs: number;
}

/** Null while the batch is open. */
export function summaryRow(batch: Batch): SummaryRow | null {
  if (!batch.closed) return null;
  return { version: summaryVersion, closedWallMs: Math.round(batch.closed.at.wall), ...accountOf(batch) };
}

const prefix = 'summary';

/**
 * Key of a row: it sorts by when the batch closed. Where a wall clock was set back before closing, the latest time
 * in the row stands in, so that no row sorts before anything it tells of.
 */
export function summaryKey(row: SummaryRow): string {
  let latestMs = row.closedWallMs;
  for (const { finishedWallMs } of row.connectors) latestMs = Math.max(latestMs, finishedWallMs);
  for (const { wallMs } of row.defects) latestMs = Math.max(latestMs, wallMs);
  for (const { wallMs } of row.lateness) latestMs = Math.max(latestMs, wallMs);
  return `${prefix}:${sortable(latestMs)}:${row.batch}`;
}

/**
 * Bounds of the keys of all rows that can tell of something at `fromWallMs` or later. There is no upper time: a
 * connector can finish in a shift whose batch closes days after it.
 */
export function summaryKeysFrom(fromWallMs: number): { readonly lower: string; readonly upper: string } {
  return { lower: `${prefix}:${sortable(fromWallMs)}:`, upper: `${prefix};` };
}

/** 13 digits reach from 1970 to the year 2286. */
function sortable(wallMs: number): string {
  const whole = Math.min(9_999_999_999_999, Math.max(0, Math.floor(wallMs)));
  return String(whole).padStart(13, '0');
}
