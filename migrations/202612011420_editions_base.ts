import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('editions', (table) => {
    // The published edition whose text it was started from, or was last merged with; none for a first edition.
    table
      .bigInteger('base_edition_id')
      .unsigned()
      .nullable()
      .references('editions.id')
      .onDelete('SET NULL')
      .after('author_id');
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('editions', (table) => {
    table.dropForeign('base_edition_id');
    table.dropColumn('base_edition_id');
  });
}
