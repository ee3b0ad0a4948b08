import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('accounts', (table) => {
    // Asked for by its owner: from this instant on the account may be deleted. Null: it stays.
    table.datetime('deletion_at', { precision: 3 });
    // What is left is “a former member”; the e-mail address is then a mark that no address can equal.
    table.datetime('deleted_at', { precision: 3 });
    table.index(['deletion_at']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('accounts', (table) => {
    table.dropIndex(['deletion_at']);
    table.dropColumns('deletion_at', 'deleted_at');
  });
}
