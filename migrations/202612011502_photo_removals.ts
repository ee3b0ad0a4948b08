import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('photo_removals', (table) => {
    // Content whose files are to go once no photo shows it; kept here until they are gone, whatever stops in between.
    table.specificType('hash', 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin').primary();
    // Widths that were made, as JSON.
    table.json('widths').notNullable();
    table.datetime('created_at', { precision: 3 }).notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('photo_removals');
}
