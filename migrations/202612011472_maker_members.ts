import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('maker_members', (table) => {
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    table.bigInteger('maker_id').unsigned().notNullable().references('makers.id');
    table.datetime('since', { precision: 3 }).notNullable();
    table.primary(['account_id', 'maker_id']);
    table.index(['maker_id', 'account_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('maker_members');
}
