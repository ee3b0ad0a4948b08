import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('trial_revisions', (table) => {
    table.bigInteger('trial_id').unsigned().notNullable().references('trials.id').onDelete('CASCADE');
    table.bigInteger('revision_id').unsigned().notNullable().references('revisions.id');
    table.primary(['trial_id', 'revision_id']);
    table.index(['revision_id', 'trial_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('trial_revisions');
}
