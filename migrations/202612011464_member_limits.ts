import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('member_limits', (table) => {
    table.bigIncrements('id');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    table.enum('kind', ['limited', 'blocked']).notNullable();
    table.text('reason').notNullable();
    // When what they wrote was taken down with it, by which it can be put back; null: it stays.
    table.datetime('works_gone_at', { precision: 3 });
    table.datetime('from_at', { precision: 3 }).notNullable();
    // The term is half open: it holds before this instant. Null: until lifted.
    table.datetime('until_at', { precision: 3 });
    table.bigInteger('set_by').unsigned().notNullable().references('accounts.id');
    table.datetime('lifted_at', { precision: 3 });
    table.bigInteger('lifted_by').unsigned().references('accounts.id');
    table.text('lift_reason').notNullable();
    table.index(['account_id', 'lifted_at', 'until_at']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('member_limits');
}
