import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.dropTable('role_changes');
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.createTable('role_changes', (table) => {
    table.bigIncrements('id');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.bigInteger('changed_by').unsigned().notNullable().references('accounts.id');
    table.string('from_role', 20).notNullable();
    table.string('to_role', 20).notNullable();
    table.datetime('created_at', { precision: 3 }).notNullable();
  });
}
