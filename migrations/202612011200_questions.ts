import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('questions', (table) => {
    table.bigIncrements('id');
    // Ends in the id, and so is given right after the row.
    table.string('slug', 120).unique();
    table.string('title', 140).notNullable();
    table.text('text').notNullable();
    // Shape: QuestionReading[] in shared/contract.
    table.json('readings').notNullable();
    // Shape: WorksheetRecord in shared/contract.
    table.json('worksheet');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.bigInteger('settled_write_up_id').unsigned().references('write_ups.id').onDelete('SET NULL');
    table.specificType('settled_fix_key', 'VARCHAR(36) CHARACTER SET ascii COLLATE ascii_bin');
    table.string('settled_fix_title', 140);
    table.datetime('created_at', { precision: 3 }).notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('questions');
}
