import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('maker_requests', (table) => {
    table.bigIncrements('id');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.bigInteger('maker_id').unsigned().notNullable().references('makers.id');
    table
      .enum('state', ['waiting-for-mail', 'waiting', 'granted', 'declined', 'ended'])
      .notNullable()
      .defaultTo('waiting');
    // What proves it: a link mailed to the maker's domain, or a moderator's decision.
    table.enum('how', ['mail', 'desk']).notNullable();
    // What the asker wrote to the desk.
    table.text('note').notNullable();
    // Why it was declined, granted by hand or ended.
    table.text('reason');
    // Null with a grant: the mailed link was the proof.
    table.bigInteger('decided_by').unsigned().references('accounts.id');
    table.datetime('decided_at', { precision: 3 });
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.index(['state', 'created_at', 'id']);
    table.index(['maker_id', 'state']);
    table.index(['account_id', 'maker_id', 'state']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('maker_requests');
}
