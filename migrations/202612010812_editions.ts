import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('editions', (table) => {
    table.bigIncrements('id');
    table.bigInteger('write_up_id').unsigned().notNullable().references('write_ups.id').onDelete('CASCADE');
    table.integer('number').unsigned().notNullable();
    table.enum('state', ['draft', 'submitted', 'returned', 'published']).notNullable().defaultTo('draft');
    table.bigInteger('author_id').unsigned().notNullable().references('accounts.id');
    // Copied from the content, so that lists need not read it.
    table.string('title', 140).notNullable();
    // Shape: EditionContent in shared/contract.
    table.json('content').notNullable();
    table.string('change_note', 300).notNullable();
    // Grows by one with each save; the ETag.
    table.integer('version').unsigned().notNullable().defaultTo(1);
    table.text('return_reason');
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.datetime('updated_at', { precision: 3 }).notNullable();
    table.datetime('submitted_at', { precision: 3 });
    table.datetime('published_at', { precision: 3 });
    // Thrown away by its author; kept so that it can be brought back and the desk's decisions keep their object.
    table.datetime('discarded_at', { precision: 3 });
    table.unique(['write_up_id', 'number']);
    table.index(['author_id', 'updated_at', 'id']);
    table.index(['state', 'submitted_at', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('editions');
}
