import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('part_redirects', (table) => {
    // Address of a part that was merged into another; links to it keep working.
    table.string('slug', 120).primary();
    table.bigInteger('part_id').unsigned().notNullable().references('parts.id');
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('part_redirects');
}
