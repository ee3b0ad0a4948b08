import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('happening_subjects', (table) => {
    table.bigInteger('happening_id').unsigned().notNullable().references('happenings.id').onDelete('CASCADE');
    // The subject may be merged away, hence no foreign key.
    table.enum('subject', ['part', 'revision', 'joint', 'write-up', 'question']).notNullable();
    table.bigInteger('subject_id').unsigned().notNullable();
    table.primary(['happening_id', 'subject', 'subject_id']);
    table.index(['subject', 'subject_id', 'happening_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('happening_subjects');
}
