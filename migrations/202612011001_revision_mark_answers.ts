import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('revision_mark_answers', (table) => {
    table.bigInteger('mark_id').unsigned().notNullable().references('revision_marks.id').onDelete('CASCADE');
    table.bigInteger('revision_id').unsigned().notNullable().references('revisions.id');
    // Whether the revision shows the mark; of one without a row it is not known.
    table.boolean('shows').notNullable();
    table.primary(['mark_id', 'revision_id']);
    table.index(['revision_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('revision_mark_answers');
}
