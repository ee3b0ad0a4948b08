import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('feature_attributes', (table) => {
    table.bigInteger('feature_id').unsigned().notNullable().references('features.id');
    table.bigInteger('revision_id').unsigned().notNullable().references('revisions.id');
    // Such as the designation or the sex of a thread: named, not measured.
    table.string('name', 40).notNullable();
    table.string('value', 60).notNullable();
    table.primary(['feature_id', 'revision_id', 'name']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('feature_attributes');
}
