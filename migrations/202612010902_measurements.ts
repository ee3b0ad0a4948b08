import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('measurements', (table) => {
    table.bigIncrements('id');
    table.bigInteger('feature_id').unsigned().notNullable().references('features.id');
    table.bigInteger('revision_id').unsigned().notNullable().references('revisions.id');
    table.string('dimension', 40).notNullable();
    // Mean and standard uncertainty in mm or degrees; what was typed stands beside them.
    table.double('value').notNullable();
    table.double('uncertainty').notNullable();
    table.json('entered').notNullable();
    table.enum('unit', ['mm', 'in', 'deg', 'count']).notNullable();
    table.string('instrument', 40).notNullable();
    table.bigInteger('photo_id').unsigned().references('photos.id');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.datetime('created_at', { precision: 3 }).notNullable();
    // Set aside with a reason, never deleted.
    table.datetime('set_aside_at', { precision: 3 });
    table.bigInteger('set_aside_by').unsigned().references('accounts.id');
    table.string('set_aside_reason', 300);
    table.index(['feature_id', 'dimension', 'revision_id', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('measurements');
}
