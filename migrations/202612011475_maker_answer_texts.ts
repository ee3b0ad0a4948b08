import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('maker_answer_texts', (table) => {
    table.bigIncrements('id');
    table.bigInteger('answer_id').unsigned().notNullable().references('maker_answers.id').onDelete('CASCADE');
    // What the answer said before it was changed, and from when to when it did.
    table.text('source').notNullable();
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.datetime('said_from', { precision: 3 }).notNullable();
    table.datetime('said_to', { precision: 3 }).notNullable();
    table.index(['answer_id', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('maker_answer_texts');
}
