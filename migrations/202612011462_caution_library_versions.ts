import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('caution_library_versions', (table) => {
    table.bigInteger('library_id').unsigned().notNullable().references('caution_library.id');
    table.integer('version').unsigned().notNullable();
    table.enum('change', ['added', 'worded', 'retired', 'put-back']).notNullable();
    table.string('name', 120).notNullable();
    table.enum('signal_word', ['danger', 'warning', 'caution']).notNullable();
    table.json('hazards').notNullable();
    table.string('hazard', 200).notNullable();
    table.string('consequence', 300).notNullable();
    table.string('avoidance', 500).notNullable();
    // Null: the site itself, for what was there before changes were kept.
    table.bigInteger('changed_by').unsigned().references('accounts.id');
    table.datetime('changed_at', { precision: 3 }).notNullable();
    table.string('why', 500).notNullable();
    table.primary(['library_id', 'version']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('caution_library_versions');
}
