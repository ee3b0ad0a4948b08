import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable('makers', (table) => {
    // Mail to an address at exactly this domain proves that somebody speaks for the maker; lower case.
    table.string('mail_domain', 253);
    // Where letters about its parts go.
    table.string('contact_address', 254);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable('makers', (table) => {
    table.dropColumns('mail_domain', 'contact_address');
  });
}
