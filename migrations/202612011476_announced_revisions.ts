import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('revisions', (table) => {
    // Announced by its maker and not sold yet; sold_from is then the day from which it is meant to be.
    table.enum('state', ['sold', 'announced']).notNullable().defaultTo('sold');
    table.datetime('announced_at', { precision: 3 });
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('revisions', (table) => {
    table.dropColumns('state', 'announced_at');
  });
}
