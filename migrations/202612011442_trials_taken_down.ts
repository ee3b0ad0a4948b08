import type { Knex } from 'knex';

/** The desk takes a trial off the pages with a reason; it is never deleted. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('trials', (table) => {
    table.datetime('taken_down_at', { precision: 3 });
    table.bigInteger('taken_down_by').unsigned().references('accounts.id');
    table.string('taken_down_reason', 1000);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('trials', (table) => {
    table.dropForeign('taken_down_by');
    table.dropColumns('taken_down_at', 'taken_down_by', 'taken_down_reason');
  });
}
