import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('fixes', (table) => {
    table.bigIncrements('id');
    table.bigInteger('write_up_id').unsigned().notNullable().references('write_ups.id').onDelete('CASCADE');
    // The same remedy keeps its key through all editions: cautions and trials hang on it.
    table.specificType('fix_key', 'VARCHAR(36) CHARACTER SET ascii COLLATE ascii_bin').notNullable();
    table.enum('standing', ['told', 'tried', 'measured', 'made-right']).notNullable().defaultTo('told');
    // The maker has corrected the part from this revision on.
    table.bigInteger('made_right_from').unsigned().references('revisions.id');
    table.unique(['write_up_id', 'fix_key']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('fixes');
}
