import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('edition_fix_revisions', (table) => {
    table.bigInteger('edition_id').unsigned().notNullable().references('editions.id').onDelete('CASCADE');
    table.bigInteger('fix_id').unsigned().notNullable().references('fixes.id').onDelete('CASCADE');
    table.bigInteger('revision_id').unsigned().notNullable().references('revisions.id');
    table.primary(['edition_id', 'fix_id', 'revision_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('edition_fix_revisions');
}
