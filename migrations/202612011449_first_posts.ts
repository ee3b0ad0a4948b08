import type { Knex } from 'knex';

/** What members post before the desk knows them; it stands on the pages while the desk looks at it. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('first_posts', (table) => {
    table.bigIncrements('id');
    table.string('subject_kind', 20).notNullable();
    table.bigInteger('subject_id').unsigned().notNullable();
    table.string('title', 300).notNullable();
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    table.enum('state', ['waiting', 'fine', 'taken-down']).notNullable().defaultTo('waiting');
    table.bigInteger('decided_by').unsigned().references('accounts.id');
    table.datetime('decided_at', { precision: 3 });
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.unique(['subject_kind', 'subject_id']);
    table.index(['state', 'created_at', 'id']);
    table.index(['account_id', 'state']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('first_posts');
}
