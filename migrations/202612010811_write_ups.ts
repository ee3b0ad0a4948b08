import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('write_ups', (table) => {
    table.bigIncrements('id');
    // Given when the first edition is published, from its title; it never changes after that.
    table.string('slug', 120).unique();
    table.bigInteger('created_by').unsigned().notNullable().references('accounts.id');
    table.bigInteger('published_edition_id').unsigned();
    table.datetime('first_published_at', { precision: 3 });
    table.datetime('created_at', { precision: 3 }).notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('write_ups');
}
