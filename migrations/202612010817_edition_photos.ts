import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('edition_photos', (table) => {
    table.bigInteger('edition_id').unsigned().notNullable().references('editions.id').onDelete('CASCADE');
    table.bigInteger('photo_id').unsigned().notNullable().references('photos.id');
    table.primary(['edition_id', 'photo_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('edition_photos');
}
