import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('digests', (table) => {
    table.bigIncrements('id');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    // The day or week it tells of, such as `day:2026-12-01`: one digest for each person and period.
    table.string('period', 20).notNullable();
    table.datetime('made_at', { precision: 3 }).notNullable();
    table.unique(['account_id', 'period']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('digests');
}
