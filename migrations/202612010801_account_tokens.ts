import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('account_tokens', (table) => {
    table.bigIncrements('id');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    table.enum('purpose', ['confirm-email', 'reset-password', 'unsubscribe']).notNullable();
    // SHA-256 of the token; the token itself only ever stands in the mail.
    table.specificType('token_hash', 'BINARY(32)').notNullable().unique();
    table.datetime('expires_at', { precision: 3 }).notNullable();
    table.datetime('used_at', { precision: 3 });
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.index(['account_id', 'purpose']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('account_tokens');
}
