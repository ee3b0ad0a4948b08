import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('watches', (table) => {
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    // One of several tables, hence no foreign key; merges of the catalogue carry watches along by themselves.
    table.enum('subject', ['part', 'revision', 'joint', 'write-up', 'question']).notNullable();
    table.bigInteger('subject_id').unsigned().notNullable();
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.primary(['account_id', 'subject', 'subject_id']);
    table.index(['subject', 'subject_id', 'account_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('watches');
}
