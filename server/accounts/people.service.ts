import type { Knex } from 'knex';
import { z } from 'zod';
import type { Account, AccountRow } from '../../shared/contract/accounts.js';
import { Id } from '../../shared/contract/primitives.js';
import type { AccountRole } from '../../shared/contract/vocabulary.js';
import { readCursor, toPage } from '../http/pages.js';
import { NotAllowed, NotFound } from '../http/problems.js';
import type { SessionAccount } from '../http/session.js';
import type { AuditLog } from '../audit/audit.js';
import type { LimitLookup } from '../members/members.js';
import { accountRow, accountView } from './account-view.js';
import {
  accountById,
  accountsNewestFirst,
  changeAccount,
  lockedAccountById,
  type AccountChange,
} from './accounts.store.js';

const ListKey = z.tuple([Id]);

export type PeopleService = ReturnType<typeof createPeopleService>;

/** The accounts there are: each person's own, and the administrator's view of all. */
export function createPeopleService({
  knex,
  audit,
  limitOn,
}: {
  knex: Knex;
  audit: AuditLog;
  limitOn: LimitLookup;
}) {
  return {
    /** What every request needs to know of its caller; undefined once the account is gone or blocked. */
    async findAccount(id: number): Promise<SessionAccount | undefined> {
      const [account, limit] = await Promise.all([accountById(knex, id), limitOn(id)]);
      if (!account || limit?.kind === 'blocked') return undefined;
      return { id: account.id, role: account.role, limit: limit ?? null };
    },

    async readAccount(id: number | null): Promise<Account | null> {
      const account = id === null ? undefined : await accountById(knex, id);
      return account ? accountView(account) : null;
    },

    async changeProfile(
      id: number,
      change: Pick<
        AccountChange,
        'displayName' | 'units' | 'noticeMail' | 'mailRhythm' | 'safetyMail' | 'benchWatch'
      >,
    ): Promise<Account | null> {
      await changeAccount(knex, id, change);
      return this.readAccount(id);
    },

    async listAccounts(wanted: {
      q?: string | undefined;
      cursor?: string | undefined;
      limit: number;
    }): Promise<{ items: AccountRow[]; next: string | null }> {
      const [beforeId] = readCursor(ListKey, wanted.cursor) ?? [];
      const found = await accountsNewestFirst(knex, { words: wanted.q, beforeId, limit: wanted.limit + 1 });
      const page = toPage(found, wanted.limit, (account) => [account.id]);
      return { items: page.items.map(accountRow), next: page.next };
    },

    /** Gives an account another role and keeps who did it. Nobody changes their own: the last administrator cannot lock all out. */
    async changeRole(id: number, role: AccountRole, changedBy: number): Promise<AccountRow> {
      if (id === changedBy)
        throw new NotAllowed('Nobody changes their own role.', 'Ask another administrator.');
      return knex.transaction(async (trx) => {
        const account = await lockedAccountById(trx, id);
        if (!account) throw new NotFound('There is no such account.', 'Look it up in the list of accounts.');
        if (account.role !== role) {
          await changeAccount(trx, id, { role });
          await audit.note(trx, {
            actorId: changedBy,
            action: 'role-changed',
            subject: { kind: 'account', id, name: account.displayName },
            details: { from: account.role, to: role },
          });
        }
        return accountRow({ ...account, role });
      });
    },
  };
}
