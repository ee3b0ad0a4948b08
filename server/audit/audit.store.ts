import type { Knex } from 'knex';
import type { AuditEntry } from './audit.js';

const longestName = 200;

export async function addEntry(trx: Knex, entry: AuditEntry, at: Date): Promise<void> {
  await trx('audit_log').insert({
    at,
    actor_id: entry.actorId,
    action: entry.action,
    subject_kind: entry.subject.kind,
    subject_id: entry.subject.id,
    subject_name: entry.subject.name.slice(0, longestName),
    reason: entry.reason ?? '',
    details: entry.details === undefined ? null : JSON.stringify(entry.details),
  });
}
