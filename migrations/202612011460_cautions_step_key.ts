import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('cautions', (table) => {
    // Key of the step of the fix it stands on; null: on all of the fix.
    table.string('step_key', 36);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('cautions', (table) => table.dropColumn('step_key'));
}
