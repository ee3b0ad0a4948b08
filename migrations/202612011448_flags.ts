import type { Knex } from 'knex';

/** One member's word on a thing that is flagged. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('flags', (table) => {
    table.bigIncrements('id');
    table.bigInteger('flagged_id').unsigned().notNullable().references('flagged.id').onDelete('CASCADE');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.enum('ground', ['unsafe', 'wrong', 'rude-or-spam', 'private-data', 'copied']).notNullable();
    table.string('line', 500).notNullable();
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.unique(['flagged_id', 'account_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('flags');
}
