import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('happenings', (table) => {
    table.bigIncrements('id');
    table.string('kind', 40).notNullable();
    // Names the event; adding it a second time does nothing.
    table.string('event_key', 190).notNullable().unique();
    table.string('title', 200).notNullable();
    table.text('text').notNullable();
    // Address within the site.
    table.string('path', 300).notNullable();
    table.bigInteger('actor_id').unsigned().references('accounts.id');
    table.datetime('at', { precision: 3 }).notNullable();
    // Set when each person it concerns has their notice.
    table.datetime('told_at', { precision: 3 });
    table.index(['told_at', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('happenings');
}
