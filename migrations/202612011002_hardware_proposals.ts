import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('hardware_proposals', (table) => {
    table.bigIncrements('id');
    table.enum('kind', ['part', 'revision', 'feature']).notNullable();
    // The part it belongs to; of a part, the one it became.
    table.bigInteger('part_id').unsigned().references('parts.id');
    // Shape: Proposed in shared/contract.
    table.json('payload').notNullable();
    table.enum('state', ['waiting', 'taken', 'declined']).notNullable().defaultTo('waiting');
    // Names what is proposed while it waits, so that the same thing waits only once; null when it is decided.
    table.string('waiting_name', 300).unique();
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.text('reason');
    table.bigInteger('decided_by').unsigned().references('accounts.id');
    table.datetime('decided_at', { precision: 3 });
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.index(['state', 'created_at', 'id']);
    table.index(['account_id', 'id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('hardware_proposals');
}
