import type { Knex } from 'knex';

/** One statement, since each would be committed by itself. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE question_replies
      -- When its writer last changed its words.
      ADD COLUMN changed_at DATETIME(3) NULL,
      -- The write-up that was started from it, published or not.
      ADD COLUMN write_up_id BIGINT UNSIGNED NULL,
      ADD CONSTRAINT question_replies_write_up_id FOREIGN KEY (write_up_id)
        REFERENCES write_ups (id) ON DELETE SET NULL
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE question_replies
      DROP FOREIGN KEY question_replies_write_up_id,
      DROP COLUMN write_up_id,
      DROP COLUMN changed_at
  `);
}
