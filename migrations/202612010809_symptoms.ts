import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('symptoms', (table) => {
    table.bigIncrements('id');
    table.string('slug', 120).notNullable().unique();
    table.string('label', 160).notNullable();
    table.string('group_name', 80).notNullable();
    table.integer('position').unsigned().notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('symptoms');
}
