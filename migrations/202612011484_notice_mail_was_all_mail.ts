import type { Knex } from 'knex';

/** Who had turned notices off before there were others than the desk's wants none of the new ones either. */
export async function up(knex: Knex): Promise<void> {
  await knex('accounts').where({ notice_mail: false }).update({ mail_rhythm: 'none' });
}

export async function down(): Promise<void> {
  // The column goes with the step before.
}
