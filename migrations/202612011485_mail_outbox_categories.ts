import type { Knex } from 'knex';

/** What somebody watches, and what concerns their safety, are stopped each by its own choice. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(
    "ALTER TABLE mail_outbox MODIFY category ENUM('account', 'notice', 'letter', 'watch', 'safety') NOT NULL",
  );
}

export async function down(knex: Knex): Promise<void> {
  await knex('mail_outbox').whereIn('category', ['watch', 'safety']).delete();
  await knex.raw("ALTER TABLE mail_outbox MODIFY category ENUM('account', 'notice', 'letter') NOT NULL");
}
