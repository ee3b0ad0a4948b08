import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('question_replies', (table) => {
    table.bigIncrements('id');
    table.bigInteger('question_id').unsigned().notNullable().references('questions.id').onDelete('CASCADE');
    table.text('text').notNullable();
    // Shape: WorksheetRecord in shared/contract.
    table.json('worksheet');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.index(['question_id', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('question_replies');
}
