import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('caution_library', (table) => {
    table.bigIncrements('id');
    table.string('slug', 120).notNullable().unique();
    table.string('name', 120).notNullable();
    table.enum('signal_word', ['danger', 'warning', 'caution']).notNullable();
    // Hazard kinds it answers, as a JSON list.
    table.json('hazards').notNullable();
    table.string('hazard', 200).notNullable();
    table.string('consequence', 300).notNullable();
    table.string('avoidance', 500).notNullable();
    table.integer('position').unsigned().notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('caution_library');
}
