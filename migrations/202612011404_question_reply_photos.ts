import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('question_reply_photos', (table) => {
    table
      .bigInteger('reply_id')
      .unsigned()
      .notNullable()
      .references('question_replies.id')
      .onDelete('CASCADE');
    table.bigInteger('photo_id').unsigned().notNullable().references('photos.id').onDelete('CASCADE');
    table.smallint('position').unsigned().notNullable();
    table.primary(['reply_id', 'photo_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('question_reply_photos');
}
