import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE questions ADD FULLTEXT INDEX questions_words (title, text)');
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE questions DROP INDEX questions_words');
}
