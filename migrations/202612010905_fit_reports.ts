import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('fit_reports', (table) => {
    table.bigIncrements('id');
    table.bigInteger('joint_id').unsigned().notNullable().references('joints.id').onDelete('CASCADE');
    table.bigInteger('revision_a').unsigned().notNullable().references('revisions.id');
    table.bigInteger('revision_b').unsigned().notNullable().references('revisions.id');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id');
    // Whether the pair sat as delivered.
    table.boolean('sat').notNullable();
    table.text('note').notNullable();
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.unique(['joint_id', 'revision_a', 'revision_b', 'account_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('fit_reports');
}
