import type { Knex } from 'knex';

/** From which identity to which; none of the new ones is itself an old one. */
export type Moves = ReadonlyMap<number, number>;

/**
 * Lets every row that names one of the old identities in `table` name the new one. The columns are read from the
 * schema's foreign keys, so that no table can be forgotten. Where a unique key has the new row already, it stays and the old one
 * goes; whoever wants another rule for a table settles it before.
 */
export async function repoint(trx: Knex, table: string, moves: Moves): Promise<void> {
  if (moves.size === 0) return;
  const olds = [...moves.keys()];
  for (const { tableName, columnName } of await columnsNaming(trx, table)) {
    await trx.raw(
      `UPDATE IGNORE ?? SET ?? = CASE ?? ${'WHEN ? THEN ? '.repeat(moves.size)}END WHERE ?? IN (?)`,
      [tableName, columnName, columnName, ...[...moves].flat(), columnName, olds],
    );
    await trx(tableName).whereIn(columnName, olds).delete();
  }
}

/** As `repoint`; then the old rows themselves go. */
export async function mergeRows(trx: Knex, table: string, moves: Moves): Promise<void> {
  if (moves.size === 0) return;
  await repoint(trx, table, moves);
  await trx(table)
    .whereIn('id', [...moves.keys()])
    .delete();
}

async function columnsNaming(trx: Knex, table: string): Promise<{ tableName: string; columnName: string }[]> {
  return trx('information_schema.KEY_COLUMN_USAGE')
    .where('TABLE_SCHEMA', trx.raw('DATABASE()'))
    .where({ REFERENCED_TABLE_NAME: table, REFERENCED_COLUMN_NAME: 'id' })
    .select({ tableName: 'TABLE_NAME', columnName: 'COLUMN_NAME' })
    .orderBy(['TABLE_NAME', 'COLUMN_NAME']);
}
