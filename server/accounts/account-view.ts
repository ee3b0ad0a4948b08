import type { Account, AccountRow } from '../../shared/contract/accounts.js';
import type { StoredAccount } from './accounts.store.js';

/** An account as its owner sees it. */
export function accountView(account: StoredAccount): Account {
  return {
    id: account.id,
    email: account.email,
    displayName: account.displayName,
    role: account.role,
    noticeMail: account.noticeMail,
    mailRhythm: account.mailRhythm,
    safetyMail: account.safetyMail,
    benchWatch: account.benchWatch,
    mailRefusedAt: account.mailRefusedAt?.toISOString() ?? null,
    units: account.units,
    createdAt: account.createdAt.toISOString(),
    deletionAt: account.deletionAt?.toISOString() ?? null,
  };
}

/** An account as an administrator sees it. */
export function accountRow(account: StoredAccount): AccountRow {
  return {
    id: account.id,
    email: account.email,
    displayName: account.displayName,
    role: account.role,
    confirmed: account.confirmedAt !== null,
    createdAt: account.createdAt.toISOString(),
  };
}
