import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('caution_library', (table) => {
    // Grows by one with each change; the ETag.
    table.integer('version').unsigned().notNullable().defaultTo(1);
    // Retired entries are offered no longer; what was taken from them stands.
    table.datetime('retired_at', { precision: 3 });
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('caution_library', (table) => table.dropColumns('version', 'retired_at'));
}
