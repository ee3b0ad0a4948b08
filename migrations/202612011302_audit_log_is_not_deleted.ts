import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(
    "CREATE TRIGGER audit_log_is_not_deleted BEFORE DELETE ON audit_log FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'The audit log is only added to.'",
  );
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TRIGGER audit_log_is_not_deleted');
}
