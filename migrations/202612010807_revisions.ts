import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('revisions', (table) => {
    table.bigIncrements('id');
    table.bigInteger('part_id').unsigned().notNullable().references('parts.id');
    table.string('label', 60).notNullable();
    // Order on the time line, the oldest first; the days may be unknown.
    table.integer('position').unsigned().notNullable();
    table.date('sold_from');
    table.date('sold_to');
    table.text('how_to_tell').notNullable();
    table.text('what_changed').notNullable();
    table.unique(['part_id', 'label']);
    table.unique(['part_id', 'position']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('revisions');
}
