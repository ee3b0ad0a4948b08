import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('own_stock', (table) => {
    table.bigIncrements('id');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    table.string('name', 80).notNullable();
    // mm.
    table.double('thickness').notNullable();
    table.double('uncertainty').notNullable();
    table.integer('available').unsigned();
    table.unique(['account_id', 'name']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('own_stock');
}
