import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('edition_fixes', (table) => {
    table.bigInteger('edition_id').unsigned().notNullable().references('editions.id').onDelete('CASCADE');
    table.bigInteger('fix_id').unsigned().notNullable().references('fixes.id').onDelete('CASCADE');
    table.integer('position').unsigned().notNullable();
    table.primary(['edition_id', 'fix_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('edition_fixes');
}
