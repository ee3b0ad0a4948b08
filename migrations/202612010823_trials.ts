import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('trials', (table) => {
    table.bigIncrements('id');
    table.bigInteger('fix_id').unsigned().notNullable().references('fixes.id').onDelete('CASCADE');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.enum('outcome', ['held', 'held-for-a-while', 'did-not-help']).notNullable();
    table.text('note').notNullable();
    // In the unit of the fix's acceptance figure.
    table.double('figure');
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.unique(['fix_id', 'account_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('trials');
}
