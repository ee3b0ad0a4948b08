import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('write_ups', (table) => {
    table.foreign('published_edition_id').references('editions.id');
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('write_ups', (table) => {
    table.dropForeign('published_edition_id');
  });
}
