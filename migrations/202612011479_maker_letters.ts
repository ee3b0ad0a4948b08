import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('maker_letters', (table) => {
    table.bigIncrements('id');
    table.bigInteger('write_up_id').unsigned().notNullable().references('write_ups.id').onDelete('CASCADE');
    table.bigInteger('maker_id').unsigned().notNullable().references('makers.id');
    // Calendar month in UTC, `2026-12`: a maker hears of a write-up once in each.
    table.specificType('month', 'CHAR(7) CHARACTER SET ascii COLLATE ascii_bin').notNullable();
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.datetime('sent_at', { precision: 3 }).notNullable();
    table.unique(['write_up_id', 'maker_id', 'month']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('maker_letters');
}
