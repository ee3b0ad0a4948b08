import type { Knex } from 'knex';

/** A letter goes to somebody who need not have an account. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw("ALTER TABLE mail_outbox MODIFY category ENUM('account', 'notice', 'letter') NOT NULL");
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw("ALTER TABLE mail_outbox MODIFY category ENUM('account', 'notice') NOT NULL");
}
