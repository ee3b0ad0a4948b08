import type { Knex } from 'knex';

/** Something that members told the desk of: one row for all who did before it was decided. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('flagged', (table) => {
    table.bigIncrements('id');
    table.string('subject_kind', 20).notNullable();
    table.bigInteger('subject_id').unsigned().notNullable();
    // As it was called when it was first told of.
    table.string('title', 300).notNullable();
    table.bigInteger('writer_id').unsigned().notNullable().references('accounts.id');
    // `<kind>:<id>` while it waits, so that a thing waits only once; null when it is decided.
    table.string('waiting_name', 60).unique();
    table.enum('state', ['waiting', 'kept', 'taken-down', 'dealt-with']).notNullable().defaultTo('waiting');
    table.text('reason');
    table.bigInteger('decided_by').unsigned().references('accounts.id');
    table.datetime('decided_at', { precision: 3 });
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.index(['state', 'created_at', 'id']);
    table.index(['subject_kind', 'subject_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('flagged');
}
