import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('mail_outbox', (table) => {
    table.bigIncrements('id');
    // One mail for one event and person, whatever is tried again.
    table.string('dedupe_key', 190).notNullable().unique();
    table.enum('category', ['account', 'notice']).notNullable();
    table.bigInteger('account_id').unsigned().references('accounts.id').onDelete('CASCADE');
    table.string('to_address', 254).notNullable();
    table.string('subject', 200).notNullable();
    table.text('body_text').notNullable();
    table.text('body_html').notNullable();
    // Set for category notice: address of the one-click unsubscribe.
    table.string('unsubscribe_url', 500);
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.integer('attempts').unsigned().notNullable().defaultTo(0);
    table.datetime('next_try_at', { precision: 3 }).notNullable();
    table.datetime('sent_at', { precision: 3 });
    table.datetime('given_up_at', { precision: 3 });
    table.text('last_error');
    table.index(['sent_at', 'given_up_at', 'next_try_at']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('mail_outbox');
}
