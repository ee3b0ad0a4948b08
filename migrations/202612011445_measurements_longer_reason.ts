import type { Knex } from 'knex';

/** A reading that is taken down with all else of a member carries the same reason, which may be longer. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('measurements', (table) => {
    table.string('set_aside_reason', 1000).alter();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex('measurements').update({ set_aside_reason: knex.raw('LEFT(set_aside_reason, 300)') });
  await knex.schema.alterTable('measurements', (table) => {
    table.string('set_aside_reason', 300).alter();
  });
}
