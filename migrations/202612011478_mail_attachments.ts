import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('mail_attachments', (table) => {
    table.bigIncrements('id');
    // Gone with its mail, and when the mail is done with.
    table.bigInteger('mail_id').unsigned().notNullable().references('mail_outbox.id').onDelete('CASCADE');
    table.string('file_name', 120).notNullable();
    table.string('media_type', 60).notNullable();
    table.specificType('content', 'MEDIUMBLOB').notNullable();
    table.index(['mail_id', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('mail_attachments');
}
