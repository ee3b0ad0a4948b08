import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('edition_sides', (table) => {
    table.bigInteger('edition_id').unsigned().notNullable().references('editions.id').onDelete('CASCADE');
    table.integer('joint').unsigned().notNullable();
    table.enum('side', ['a', 'b']).notNullable();
    table.bigInteger('part_id').unsigned().notNullable().references('parts.id');
    table.primary(['edition_id', 'joint', 'side']);
    table.index(['part_id', 'edition_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('edition_sides');
}
