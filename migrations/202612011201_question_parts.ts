import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('question_parts', (table) => {
    table.bigInteger('question_id').unsigned().notNullable().references('questions.id').onDelete('CASCADE');
    table.integer('position').unsigned().notNullable();
    table.bigInteger('part_id').unsigned().notNullable().references('parts.id');
    // Null while the asker does not know which one it is.
    table.bigInteger('revision_id').unsigned().references('revisions.id');
    table.primary(['question_id', 'position']);
    table.index(['part_id', 'question_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('question_parts');
}
