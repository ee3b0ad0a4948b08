import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('photos', (table) => {
    table.bigIncrements('id');
    table.specificType('hash', 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin').notNullable();
    table.bigInteger('owner_id').unsigned().notNullable().references('accounts.id');
    table.integer('width').unsigned().notNullable();
    table.integer('height').unsigned().notNullable();
    // Widths that were made, ascending, as JSON.
    table.json('widths').notNullable();
    table.text('placeholder').notNullable();
    table.string('alt', 300).notNullable();
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.unique(['hash', 'owner_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('photos');
}
