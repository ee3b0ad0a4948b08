import { z } from 'zod';
import { NotValid } from './problems.js';

/**
 * Keyset pages: the cursor is the sort key of the last row shown, base64url of JSON. It is no secret and is checked
 * against the schema of the list it belongs to.
 */
export function readCursor<T>(schema: z.ZodType<T>, cursor: string | undefined): T | undefined {
  if (cursor === undefined) return undefined;
  let value: unknown;
  try {
    value = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
  } catch {
    value = undefined;
  }
  const parsed = schema.safeParse(value);
  if (!parsed.success)
    throw new NotValid([
      { path: 'cursor', message: 'is not a place in this list', remedy: 'Start from the first page.' },
    ]);
  return parsed.data;
}

export function writeCursor(key: unknown): string {
  return Buffer.from(JSON.stringify(key), 'utf8').toString('base64url');
}

/** Cuts rows read with `limit + 1` to a page; the extra row only tells that there is a next one. */
export function toPage<Row>(
  rows: readonly Row[],
  limit: number,
  keyOf: (row: Row) => unknown,
): { items: Row[]; next: string | null } {
  const items = rows.slice(0, limit);
  const last = items.at(-1);
  return { items, next: rows.length > limit && last !== undefined ? writeCursor(keyOf(last)) : null };
}
