import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('maker_proofs', (table) => {
    table.bigIncrements('id');
    table
      .bigInteger('request_id')
      .unsigned()
      .notNullable()
      .references('maker_requests.id')
      .onDelete('CASCADE');
    table.string('address', 254).notNullable();
    // SHA-256 of the token; the token itself only ever stands in the mail.
    table.specificType('token_hash', 'BINARY(32)').notNullable().unique();
    table.datetime('expires_at', { precision: 3 }).notNullable();
    table.datetime('used_at', { precision: 3 });
    table.datetime('created_at', { precision: 3 }).notNullable();
    table.index(['request_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('maker_proofs');
}
