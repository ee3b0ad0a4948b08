import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('accounts', (table) => {
    table.enum('mail_rhythm', ['at-once', 'daily', 'weekly', 'none']).notNullable().defaultTo('at-once');
    // Whether they are told of what changes on their bench; null until they have been asked.
    table.boolean('bench_watch');
    table.boolean('safety_mail').notNullable().defaultTo(true);
    // When mail to the address was last refused for good; only confirming the address takes it back.
    table.datetime('mail_refused_at', { precision: 3 });
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('accounts', (table) => {
    table.dropColumns('mail_rhythm', 'bench_watch', 'safety_mail', 'mail_refused_at');
  });
}
