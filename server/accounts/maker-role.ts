import type { Knex } from 'knex';
import type { AuditLog } from '../audit/audit.js';
import { changeAccount, lockedAccountById } from './accounts.store.js';

/** The role that goes with speaking for a maker. Moderators and administrators keep theirs. */
export interface MakerRole {
  /** A member becomes a maker; `by` null: the mailed link did it. */
  give(trx: Knex.Transaction, accountId: number, by: number | null): Promise<void>;
  /** A maker becomes a member again. */
  take(trx: Knex.Transaction, accountId: number, by: number | null): Promise<void>;
}

export function createMakerRole({ audit }: { audit: AuditLog }): MakerRole {
  const change = async (
    trx: Knex.Transaction,
    accountId: number,
    { from, to, by }: { from: 'member' | 'maker'; to: 'member' | 'maker'; by: number | null },
  ): Promise<void> => {
    const account = await lockedAccountById(trx, accountId);
    if (account?.role !== from) return;
    await changeAccount(trx, accountId, { role: to });
    await audit.note(trx, {
      actorId: by,
      action: 'role-changed',
      subject: { kind: 'account', id: accountId, name: account.displayName },
      details: { from, to },
    });
  };
  return {
    give: (trx, accountId, by) => change(trx, accountId, { from: 'member', to: 'maker', by }),
    take: (trx, accountId, by) => change(trx, accountId, { from: 'maker', to: 'member', by }),
  };
}
