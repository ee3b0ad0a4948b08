import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('audit_log', (table) => {
    table.bigIncrements('id');
    table.datetime('at', { precision: 3 }).notNullable();
    // Null: the site itself, such as a claim that ran out.
    table.bigInteger('actor_id').unsigned().references('accounts.id');
    table.string('action', 60).notNullable();
    table.string('subject_kind', 40).notNullable();
    // The subject may be gone one day, hence its name and no foreign key.
    table.bigInteger('subject_id').unsigned().notNullable();
    table.string('subject_name', 200).notNullable();
    table.text('reason').notNullable();
    // What the action changed, as JSON; its members depend on the action.
    table.json('details');
    table.index(['subject_kind', 'subject_id', 'id']);
    table.index(['actor_id', 'id']);
    table.index(['action', 'id']);
    table.index(['at', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('audit_log');
}
