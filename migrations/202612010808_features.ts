import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('features', (table) => {
    table.bigIncrements('id');
    table.bigInteger('part_id').unsigned().notNullable().references('parts.id');
    table.string('slug', 120).notNullable();
    table.string('name', 120).notNullable();
    table.string('kind', 40).notNullable();
    table.unique(['part_id', 'slug']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('features');
}
