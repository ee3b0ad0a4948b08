import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('desk_claims', (table) => {
    // Kinds as in shared/contract/desk-queue.ts; what is claimed lies in a table of its own, hence no foreign key.
    table.string('kind', 20).notNullable();
    table.bigInteger('item_id').unsigned().notNullable();
    table.bigInteger('moderator_id').unsigned().notNullable().references('accounts.id');
    // A claim that has run out is as good as none.
    table.datetime('until', { precision: 3 }).notNullable();
    table.primary(['kind', 'item_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('desk_claims');
}
