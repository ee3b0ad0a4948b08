import type { Knex } from 'knex';

/** Photos used outside of editions, which no decision on an edition covers: the desk looks at each once. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('photo_looks', (table) => {
    table.bigInteger('photo_id').unsigned().primary().references('photos.id').onDelete('CASCADE');
    table.enum('state', ['waiting', 'fine', 'taken-down']).notNullable().defaultTo('waiting');
    table.bigInteger('decided_by').unsigned().references('accounts.id');
    table.datetime('decided_at', { precision: 3 });
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.index(['state', 'created_at', 'photo_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('photo_looks');
}
