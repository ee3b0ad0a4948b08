import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('makers', (table) => {
    table.bigIncrements('id');
    table.string('slug', 120).notNullable().unique();
    table.string('name', 120).notNullable();
    table.text('about').notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('makers');
}
