import type { Knex } from 'knex';

/** Every column of the database that names an account, as `table.column`. */
export async function accountColumns(knex: Knex): Promise<string[]> {
  const [rows] = (await knex.raw(`
    SELECT CONCAT(table_name, '.', column_name) AS name FROM information_schema.key_column_usage
      WHERE table_schema = DATABASE() AND referenced_table_name = 'accounts'
    UNION SELECT CONCAT(table_name, '.', column_name) FROM information_schema.columns
      WHERE table_schema = DATABASE()
        AND column_name REGEXP '^(account|author|owner|member|person|user|writer|moderator)_id$|^(created|placed|changed|written)_by$'
  `)) as [{ name: string }[]];
  return rows.map(({ name }) => name);
}
