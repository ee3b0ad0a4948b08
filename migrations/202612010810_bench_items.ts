import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('bench_items', (table) => {
    table.bigIncrements('id');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    table.bigInteger('part_id').unsigned().notNullable().references('parts.id');
    // Null while the owner has not found out which revision it is.
    table.bigInteger('revision_id').unsigned().references('revisions.id');
    table.datetime('created_at', { precision: 3 }).notNullable();
    // NULLs do not collide in a unique key, so the unknown revision is held apart by a stand-in of zero.
    table.specificType('revision_or_zero', 'BIGINT UNSIGNED GENERATED ALWAYS AS (COALESCE(revision_id, 0)) STORED');
    table.unique(['account_id', 'part_id', 'revision_or_zero']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('bench_items');
}
