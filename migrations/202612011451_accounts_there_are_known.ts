import type { Knex } from 'knex';

/** Who was there before the desk looked at first posts is known to it. */
export async function up(knex: Knex): Promise<void> {
  await knex('accounts').update({ known_at: knex.ref('created_at') });
}

export async function down(knex: Knex): Promise<void> {
  await knex('accounts').update({ known_at: null });
}
