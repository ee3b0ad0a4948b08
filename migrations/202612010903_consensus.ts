import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('consensus', (table) => {
    // Made anew whenever a reading comes or goes, so that no page ever reads all measurements.
    table.bigInteger('feature_id').unsigned().notNullable().references('features.id');
    table.bigInteger('revision_id').unsigned().notNullable().references('revisions.id');
    table.string('dimension', 40).notNullable();
    table.integer('count').unsigned().notNullable();
    table.double('mean').notNullable();
    table.double('uncertainty').notNullable();
    table.double('prediction_spread').notNullable();
    table.boolean('thin').notNullable();
    table.integer('unit_slips').unsigned().notNullable();
    table.primary(['feature_id', 'revision_id', 'dimension']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('consensus');
}
