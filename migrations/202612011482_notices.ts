import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('notices', (table) => {
    table.bigIncrements('id');
    table.bigInteger('happening_id').unsigned().notNullable().references('happenings.id').onDelete('CASCADE');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    // When it happened.
    table.datetime('at', { precision: 3 }).notNullable();
    // Concerns their safety: goes at once, whatever they chose.
    table.boolean('at_once').notNullable();
    table.enum('because', ['watch', 'bench', 'person']).notNullable();
    // What they watch or have; null where it concerns them as a person.
    table.enum('subject', ['part', 'revision', 'joint', 'write-up', 'question']);
    table.bigInteger('subject_id').unsigned();
    table.enum('mail', ['none', 'at-once', 'digest']).notNullable();
    // When it was handed to the outbox.
    table.datetime('mailed_at', { precision: 3 });
    table.bigInteger('digest_id').unsigned().references('digests.id').onDelete('SET NULL');
    table.datetime('read_at', { precision: 3 });
    table.unique(['happening_id', 'account_id']);
    table.index(['account_id', 'id']);
    table.index(['account_id', 'read_at', 'id']);
    table.index(['mail', 'mailed_at', 'at', 'account_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('notices');
}
