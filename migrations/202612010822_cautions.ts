import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('cautions', (table) => {
    table.bigIncrements('id');
    table.bigInteger('write_up_id').unsigned().notNullable().references('write_ups.id').onDelete('CASCADE');
    // Null: on the whole write-up.
    table.bigInteger('fix_id').unsigned().references('fixes.id').onDelete('CASCADE');
    table.bigInteger('library_id').unsigned().references('caution_library.id');
    table.enum('signal_word', ['danger', 'warning', 'caution']).notNullable();
    table.json('hazards').notNullable();
    table.string('hazard', 200).notNullable();
    table.string('consequence', 300).notNullable();
    table.string('avoidance', 500).notNullable();
    table.bigInteger('placed_by').unsigned().notNullable().references('accounts.id');
    table.datetime('placed_at', { precision: 3 }).notNullable();
    // A caution is taken off, never deleted: what stood over a step must stay provable.
    table.datetime('removed_at', { precision: 3 });
    table.index(['write_up_id', 'removed_at']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('cautions');
}
