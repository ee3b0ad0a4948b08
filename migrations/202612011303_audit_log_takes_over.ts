import type { Knex } from 'knex';

/** What was noted in three tables so far goes to the one log. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    INSERT INTO audit_log (at, actor_id, action, subject_kind, subject_id, subject_name, reason, details)
    SELECT at, actor_id, action, subject_kind, subject_id, subject_name, reason, details FROM (
      SELECT d.created_at AS at, d.moderator_id AS actor_id,
        IF(d.decision IN ('published', 'returned'), CONCAT('edition-', d.decision), d.decision) AS action,
        'edition' AS subject_kind, d.edition_id AS subject_id, e.title AS subject_name, d.reason, NULL AS details
      FROM desk_decisions d JOIN editions e ON e.id = d.edition_id
      UNION ALL
      SELECT r.created_at, r.changed_by, 'role-changed', 'account', r.account_id, a.display_name, '',
        JSON_OBJECT('from', r.from_role, 'to', r.to_role)
      FROM role_changes r JOIN accounts a ON a.id = r.account_id
      UNION ALL
      SELECT m.created_at, m.moderator_id, 'merged', m.kind, m.from_id, m.from_name, '', JSON_OBJECT('into', m.into_id)
      FROM hardware_merges m
    ) AS noted ORDER BY at
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex('audit_log').truncate();
}
