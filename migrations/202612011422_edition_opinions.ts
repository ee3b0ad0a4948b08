import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('edition_opinions', (table) => {
    // What an author of a write-up tells the desk of an edition that somebody else proposes on it.
    table.bigInteger('edition_id').unsigned().notNullable().references('editions.id').onDelete('CASCADE');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    table.boolean('agrees').notNullable();
    table.string('line', 300).notNullable();
    table.datetime('at', { precision: 3 }).notNullable();
    table.primary(['edition_id', 'account_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('edition_opinions');
}
