import type { Knex } from 'knex';

/** What is in the library so far is the first version of each entry. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    INSERT INTO caution_library_versions
      (library_id, version, \`change\`, name, signal_word, hazards, hazard, consequence, avoidance, changed_by, changed_at, why)
    SELECT id, 1, 'added', name, signal_word, hazards, hazard, consequence, avoidance, NULL, UTC_TIMESTAMP(3), ''
    FROM caution_library
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex('caution_library_versions').delete();
}
