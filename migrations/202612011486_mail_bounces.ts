import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('mail_bounces', (table) => {
    // One mail counts once, however many reports of it come in.
    table.bigInteger('mail_id').unsigned().notNullable().references('mail_outbox.id').onDelete('CASCADE');
    table.boolean('permanent').notNullable();
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    // Enhanced status code (RFC 3463), such as 5.1.1.
    table.string('status', 12).notNullable();
    table.datetime('at', { precision: 3 }).notNullable();
    table.primary(['mail_id', 'permanent']);
    table.index(['account_id', 'at']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('mail_bounces');
}
