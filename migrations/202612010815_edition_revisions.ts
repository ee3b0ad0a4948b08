import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('edition_revisions', (table) => {
    table.bigInteger('edition_id').unsigned().notNullable().references('editions.id').onDelete('CASCADE');
    table.bigInteger('revision_id').unsigned().notNullable().references('revisions.id');
    table.boolean('holds').notNullable();
    table.primary(['edition_id', 'revision_id']);
    table.index(['revision_id', 'edition_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('edition_revisions');
}
