import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('hand_overs', (table) => {
    table.bigIncrements('id');
    table.bigInteger('from_id').unsigned().notNullable().references('accounts.id');
    // Null: nobody has an account under the address that was named, which the giver is not told.
    table.bigInteger('to_id').unsigned().references('accounts.id');
    // Name or address as the giver wrote it; emptied when the account is deleted.
    table.string('addressed_to', 254).notNullable();
    table
      .enum('state', ['waiting', 'taken', 'declined', 'called-off', 'run-out', 'done'])
      .notNullable()
      .defaultTo('waiting');
    table.datetime('offered_at', { precision: 3 }).notNullable();
    // The offer is half open: it can be taken before this instant.
    table.datetime('ends_at', { precision: 3 }).notNullable();
    table.datetime('decided_at', { precision: 3 });
    table.index(['from_id', 'state']);
    table.index(['to_id', 'state']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('hand_overs');
}
