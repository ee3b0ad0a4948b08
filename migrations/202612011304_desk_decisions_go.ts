import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.dropTable('desk_decisions');
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.createTable('desk_decisions', (table) => {
    table.bigIncrements('id');
    table.bigInteger('edition_id').unsigned().notNullable().references('editions.id');
    table.bigInteger('moderator_id').unsigned().notNullable().references('accounts.id');
    table
      .enum('decision', ['published', 'returned', 'caution-placed', 'caution-changed', 'caution-removed'])
      .notNullable();
    table.text('reason').notNullable();
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.index(['edition_id', 'id']);
  });
}
