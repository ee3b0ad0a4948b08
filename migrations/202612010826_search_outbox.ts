import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('search_outbox', (table) => {
    table.bigIncrements('id');
    // The write-up whose index document must be made anew; it may be gone, hence no foreign key.
    table.bigInteger('write_up_id').unsigned().notNullable();
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.integer('attempts').unsigned().notNullable().defaultTo(0);
    table.datetime('next_try_at', { precision: 3 }).notNullable();
    table.text('last_error');
    table.index(['next_try_at', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('search_outbox');
}
