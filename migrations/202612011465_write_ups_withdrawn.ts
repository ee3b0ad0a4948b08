import type { Knex } from 'knex';

/** One statement, since each would be committed by itself. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE write_ups
      -- While it is withdrawn no edition is the published one; this is the one to put back.
      ADD COLUMN withdrawn_edition_id BIGINT UNSIGNED NULL,
      ADD COLUMN withdrawn_at DATETIME(3) NULL,
      ADD COLUMN withdrawn_by BIGINT UNSIGNED NULL,
      ADD COLUMN withdrawn_reason TEXT NULL,
      -- Where to go instead.
      ADD COLUMN instead_id BIGINT UNSIGNED NULL,
      -- The limit of its only author that it was withdrawn with.
      ADD COLUMN withdrawn_limit_id BIGINT UNSIGNED NULL,
      ADD CONSTRAINT write_ups_withdrawn_by FOREIGN KEY (withdrawn_by) REFERENCES accounts (id),
      ADD CONSTRAINT write_ups_instead_id FOREIGN KEY (instead_id) REFERENCES write_ups (id) ON DELETE SET NULL,
      ADD CONSTRAINT write_ups_withdrawn_limit_id FOREIGN KEY (withdrawn_limit_id)
        REFERENCES member_limits (id) ON DELETE SET NULL
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE write_ups
      DROP FOREIGN KEY write_ups_withdrawn_by,
      DROP FOREIGN KEY write_ups_instead_id,
      DROP FOREIGN KEY write_ups_withdrawn_limit_id,
      DROP COLUMN withdrawn_edition_id,
      DROP COLUMN withdrawn_at,
      DROP COLUMN withdrawn_by,
      DROP COLUMN withdrawn_reason,
      DROP COLUMN instead_id,
      DROP COLUMN withdrawn_limit_id
  `);
}
