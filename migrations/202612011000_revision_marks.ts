import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('revision_marks', (table) => {
    table.bigIncrements('id');
    table.bigInteger('part_id').unsigned().notNullable().references('parts.id');
    // What can be seen without measuring, such as "clamp screw on the left".
    table.string('text', 160).notNullable();
    table.unique(['part_id', 'text']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('revision_marks');
}
