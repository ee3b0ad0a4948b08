import type { Knex } from 'knex';

/** When the desk had found enough of a member's posts fine; null while it still looks at each. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('accounts', (table) => {
    table.datetime('known_at', { precision: 3 });
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('accounts', (table) => {
    table.dropColumn('known_at');
  });
}
