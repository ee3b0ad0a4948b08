import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('revision_photos', (table) => {
    table.bigInteger('revision_id').unsigned().notNullable().references('revisions.id').onDelete('CASCADE');
    table.bigInteger('photo_id').unsigned().notNullable().references('photos.id');
    table.smallint('position').unsigned().notNullable();
    // What to look at.
    table.string('caption', 200).notNullable();
    table.primary(['revision_id', 'photo_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('revision_photos');
}
