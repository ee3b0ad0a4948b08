import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('sessions', (table) => {
    table.string('sid', 255).primary();
    table.json('sess').notNullable();
    table.datetime('expired').notNullable().index();
    // Lets one statement end every session of an account.
    table.specificType(
      'account_id',
      "BIGINT UNSIGNED GENERATED ALWAYS AS (CAST(JSON_VALUE(sess, '$.passport.user') AS UNSIGNED)) STORED",
    );
    table.index(['account_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('sessions');
}
