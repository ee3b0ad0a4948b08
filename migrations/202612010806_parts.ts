import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('parts', (table) => {
    table.bigIncrements('id');
    table.string('slug', 120).notNullable().unique();
    table.bigInteger('maker_id').unsigned().notNullable().references('makers.id');
    table.string('name', 120).notNullable();
    table.string('kind', 40).notNullable().index();
    table.text('about').notNullable();
    table.bigInteger('photo_id').unsigned().references('photos.id');
    table.unique(['maker_id', 'name']);
    table.index(['name', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('parts');
}
