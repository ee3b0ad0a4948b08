import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('accounts', (table) => {
    table.bigIncrements('id');
    table.string('email', 254).notNullable().unique();
    table.string('display_name', 60).notNullable();
    table.enum('role', ['member', 'maker', 'moderator', 'administrator']).notNullable().defaultTo('member');
    table.string('password_hash', 255).notNullable();
    table.datetime('confirmed_at', { precision: 3 });
    table.boolean('notice_mail').notNullable().defaultTo(true);
    table.enum('units', ['mm', 'in']).notNullable().defaultTo('mm');
    table.datetime('created_at', { precision: 3 }).notNullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('accounts');
}
