import type { Knex } from 'knex';
import { addEntry } from './audit.store.js';

/** What an entry of the audit log is about. */
export type AuditSubject =
  | 'account'
  | 'caution'
  | 'edition'
  | 'feature'
  | 'fit-report'
  | 'flag'
  | 'library-caution'
  | 'maker'
  | 'maker-request'
  | 'measurement'
  | 'part'
  | 'photo'
  | 'proposal'
  | 'question'
  | 'reply'
  | 'revision'
  | 'trial'
  | 'write-up';

export interface AuditEntry {
  /** Null: the site itself. */
  readonly actorId: number | null;
  /** What was done, in words joined by hyphens: `edition-published`. */
  readonly action: string;
  readonly subject: { readonly kind: AuditSubject; readonly id: number; readonly name: string };
  readonly reason?: string;
  /** What changed, where the action alone does not say it. */
  readonly details?: Readonly<Record<string, unknown>>;
}

/** Who decided what, when and why. Entries are only ever added; the database refuses anything else. */
export interface AuditLog {
  /** Within the transaction of what it tells of. */
  note(trx: Knex, entry: AuditEntry): Promise<void>;
}

export function createAuditLog({ clock }: { clock: () => Date }): AuditLog {
  return { note: (trx, entry) => addEntry(trx, entry, clock()) };
}
