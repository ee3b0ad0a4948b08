import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('account_tokens', (table) => {
    // The sign-up that this token confirms; null on tokens of any other purpose.
    table.string('display_name', 60);
    table.string('password_hash', 255);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('account_tokens', (table) =>
    table.dropColumns('display_name', 'password_hash'),
  );
}
