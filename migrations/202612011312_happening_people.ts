import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('happening_people', (table) => {
    // Whom it concerns whether or not they watch anything.
    table.bigInteger('happening_id').unsigned().notNullable().references('happenings.id').onDelete('CASCADE');
    table.bigInteger('account_id').unsigned().notNullable().references('accounts.id').onDelete('CASCADE');
    // Told at once, whatever they chose about mail.
    table.boolean('at_once').notNullable();
    table.primary(['happening_id', 'account_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('happening_people');
}
