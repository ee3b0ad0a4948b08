import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('question_symptoms', (table) => {
    table.bigInteger('question_id').unsigned().notNullable().references('questions.id').onDelete('CASCADE');
    table.bigInteger('symptom_id').unsigned().notNullable().references('symptoms.id');
    table.primary(['question_id', 'symptom_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('question_symptoms');
}
