import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('joints', (table) => {
    table.bigIncrements('id');
    table.string('slug', 120).notNullable().unique();
    table.string('name', 160).notNullable();
    table.string('kind', 40).notNullable();
    table.bigInteger('feature_a').unsigned().notNullable().references('features.id');
    table.bigInteger('feature_b').unsigned().notNullable().references('features.id');
    table.unique(['feature_a', 'feature_b', 'kind']);
    table.index(['feature_b']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('joints');
}
