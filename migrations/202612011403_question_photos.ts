import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('question_photos', (table) => {
    table.bigInteger('question_id').unsigned().notNullable().references('questions.id').onDelete('CASCADE');
    table.bigInteger('photo_id').unsigned().notNullable().references('photos.id').onDelete('CASCADE');
    table.smallint('position').unsigned().notNullable();
    table.primary(['question_id', 'photo_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('question_photos');
}
