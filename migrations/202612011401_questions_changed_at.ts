import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('questions', (table) => {
    // When its asker last changed its words or readings.
    table.datetime('changed_at', { precision: 3 });
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('questions', (table) => {
    table.dropColumn('changed_at');
  });
}
