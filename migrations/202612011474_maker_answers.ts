import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('maker_answers', (table) => {
    table.bigIncrements('id');
    table.bigInteger('maker_id').unsigned().notNullable().references('makers.id');
    table.bigInteger('write_up_id').unsigned().notNullable().references('write_ups.id').onDelete('CASCADE');
    // Markdown as written.
    table.text('source').notNullable();
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.datetime('changed_at', { precision: 3 }).notNullable();
    // Not shown from then on; writing it anew shows it again.
    table.datetime('taken_back_at', { precision: 3 });
    table.unique(['maker_id', 'write_up_id']);
    table.index(['write_up_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('maker_answers');
}
