import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.dropTable('hardware_merges');
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.createTable('hardware_merges', (table) => {
    table.bigIncrements('id');
    table.enum('kind', ['part', 'revision', 'feature']).notNullable();
    // What is gone, by name and by the identity it had: no foreign key.
    table.bigInteger('from_id').unsigned().notNullable();
    table.string('from_name', 120).notNullable();
    table.bigInteger('into_id').unsigned().notNullable();
    table.bigInteger('moderator_id').unsigned().notNullable().references('accounts.id');
    table.datetime('created_at', { precision: 3 }).notNullable();
  });
}
