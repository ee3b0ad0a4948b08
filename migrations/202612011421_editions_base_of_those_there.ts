import type { Knex } from 'knex';

/**
 * Editions from before bases were kept: one that is published followed the one numbered before it, one under way began
 * from the last that had been published when it was started.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    UPDATE editions AS e
    JOIN (
      SELECT later.id, MAX(earlier.number) AS number
      FROM editions AS later
      JOIN editions AS earlier
        ON earlier.write_up_id = later.write_up_id AND earlier.state = 'published' AND earlier.id <> later.id
      WHERE (later.state <> 'published' AND earlier.published_at <= later.created_at)
         OR (later.state = 'published' AND earlier.number < later.number)
      GROUP BY later.id
    ) AS found ON found.id = e.id
    JOIN editions AS base ON base.write_up_id = e.write_up_id AND base.number = found.number
    SET e.base_edition_id = base.id`);
}

export async function down(knex: Knex): Promise<void> {
  await knex('editions').update({ base_edition_id: null });
}
