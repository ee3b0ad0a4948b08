import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('parts', (table) => {
    // Band in words, such as "30 to 45 euro"; prices age, so no figure is stored.
    table.string('price_band', 60);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('parts', (table) => {
    table.dropColumn('price_band');
  });
}
