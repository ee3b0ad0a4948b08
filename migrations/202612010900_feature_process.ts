import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('features', (table) => {
    // How it is made: sets the spread to expect between parts of one revision.
    table.enum('process', ['machined', 'printed', 'cast']).notNullable().defaultTo('machined');
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('features', (table) => {
    table.dropColumn('process');
  });
}
