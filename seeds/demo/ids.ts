import type { Knex } from 'knex';

/** Hands out identities of a table, from the first free one on; `next()` and `count` go together in a batched insert. */
export async function idsFrom(knex: Knex, table: string): Promise<() => number> {
  const row = await knex(table).max({ last: 'id' }).first<{ last: number | null }>();
  let last = Number(row.last ?? 0);
  return () => ++last;
}

/** Rows in batches, so that no statement outgrows the server's packet. */
export async function insertRows(knex: Knex, table: string, rows: readonly object[]): Promise<void> {
  if (rows.length > 0) await knex.batchInsert(table, rows as object[], 100);
}
