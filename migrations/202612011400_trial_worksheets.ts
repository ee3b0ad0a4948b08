import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('trials', (table) => {
    // Shape: WorksheetRecord in shared/contract.
    table.json('worksheet');
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('trials', (table) => {
    table.dropColumn('worksheet');
  });
}
