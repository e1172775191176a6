import type { Head, Line } from '../core/event/entry.ts';
import { headSchema } from '../core/event/envelope.ts';
import type { DerivedRow } from './store.ts';

/*
 * Stored rows are read, never trusted. A row that lost its text is still given, as an empty text, so that its line shows
 * as damaged and does not vanish.
 */

const fieldsOf = (row: unknown): Readonly<Record<string, unknown>> =>
  typeof row === 'object' && row !== null ? (row as Record<string, unknown>) : {};

const textOr = (value: unknown, otherwise: string): string => (typeof value === 'string' ? value : otherwise);

export function readLineText(row: unknown): string {
  return textOr(fieldsOf(row).text, '');
}

/** Null where the row cannot be addressed. */
export function readLineRow(row: unknown): Line | null {
  const { log, seq, batch, text } = fieldsOf(row);
  if (typeof log !== 'string' || typeof seq !== 'number') return null;
  return { log, seq, batch: textOr(batch, ''), text: textOr(text, '') };
}

export function readHeadRow(row: unknown): Head | null {
  const read = headSchema.safeParse(row);
  return read.success ? read.data : null;
}

export function readDerivedRow(row: unknown): DerivedRow | null {
  const { key, value } = fieldsOf(row);
  return typeof key === 'string' && typeof value === 'string' ? { key, value } : null;
}

export function readAll<Row>(rows: readonly unknown[], read: (row: unknown) => Row | null): Row[] {
  return rows.map(read).filter((row) => row !== null);
}
