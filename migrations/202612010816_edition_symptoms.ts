import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('edition_symptoms', (table) => {
    table.bigInteger('edition_id').unsigned().notNullable().references('editions.id').onDelete('CASCADE');
    table.bigInteger('symptom_id').unsigned().notNullable().references('symptoms.id');
    table.primary(['edition_id', 'symptom_id']);
    table.index(['symptom_id', 'edition_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('edition_symptoms');
}
