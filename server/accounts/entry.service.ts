import type { Knex } from 'knex';
import { endSessionsOf } from '../http/session-store.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { MailQueue } from '../mail/mail-queue.js';
import { EmailNotConfirmed, TokenNotValid } from './account-problems.js';
import {
  accountByEmail,
  accountById,
  addAccountUnlessThere,
  changeAccount,
  lockedAccountByEmail,
  type StoredAccount,
} from './accounts.store.js';
import { hashOfToken, newMailedToken } from './mailed-token.js';
import { hashPassword, passwordMatches } from './password.js';
import { addToken, endTokens, useToken, type TokenPurpose } from './tokens.store.js';

const hour = 60 * 60 * 1000;
const lifeOf: Record<TokenPurpose, number> = { 'confirm-email': 24 * hour, 'reset-password': hour };

export interface EntryDependencies {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly mail: MailQueue;
  readonly limits: RateLimits;
}

export type EntryService = ReturnType<typeof createEntryService>;

/** How people come in: sign-up, confirmation, sign-in, and a new password when the old one is lost. */
export function createEntryService({ knex, clock, mail, limits }: EntryDependencies) {
  const mailToken = async (
    trx: Knex.Transaction,
    account: StoredAccount,
    purpose: TokenPurpose,
  ): Promise<void> => {
    const now = clock();
    const { token, hash } = newMailedToken();
    const expiresAt = new Date(now.getTime() + lifeOf[purpose]);
    const tokenId = await addToken(trx, { accountId: account.id, purpose, hash, expiresAt, now });
    const letter = {
      accountId: account.id,
      email: account.email,
      displayName: account.displayName,
      token,
      tokenId,
    };
    if (purpose === 'confirm-email') await mail.queueEmailConfirmation(trx, letter);
    else await mail.queuePasswordReset(trx, letter);
  };

  return {
    /**
     * Adds an account and mails the link to confirm it. Where the address has one already, its owner is told by mail
     * and the caller learns nothing. An account that was never confirmed takes over the newest name and password, so
     * that nobody can reserve a stranger's address under a password of their own.
     */
    async signUp(wish: { email: string; displayName: string; password: string; ip: string }): Promise<void> {
      await limits.take('sign-up', wish.ip);
      await limits.take('account-mail', wish.email);
      const passwordHash = await hashPassword(wish.password);
      await knex.transaction(async (trx) => {
        await addAccountUnlessThere(trx, {
          email: wish.email,
          displayName: wish.displayName,
          passwordHash,
          createdAt: clock(),
        });
        const account = await lockedAccountByEmail(trx, wish.email);
        if (!account) throw new TypeError('An account that was just added is not there.');
        if (account.confirmedAt) {
          await mail.queueAlreadyHasAccount(trx, account);
          return;
        }
        await changeAccount(trx, account.id, { displayName: wish.displayName, passwordHash });
        await mailToken(trx, { ...account, displayName: wish.displayName }, 'confirm-email');
      });
    },

    /** Confirms the address; throws TokenNotValid. */
    async confirmEmail(token: string, ip: string): Promise<StoredAccount> {
      await limits.take('token', ip);
      return knex.transaction(async (trx) => {
        const now = clock();
        const accountId = await useToken(trx, 'confirm-email', hashOfToken(token), now);
        if (accountId === undefined) throw new TokenNotValid();
        await changeAccount(trx, accountId, { confirmedAt: now });
        const account = await accountById(trx, accountId);
        if (!account) throw new TokenNotValid();
        return account;
      });
    },

    async resendConfirmation(email: string): Promise<void> {
      await limits.take('account-mail', email);
      await knex.transaction(async (trx) => {
        const account = await lockedAccountByEmail(trx, email);
        if (account && !account.confirmedAt) await mailToken(trx, account, 'confirm-email');
      });
    },

    /**
     * The account of a right pair of address and password, undefined for a wrong one. Throws EmailNotConfirmed, and
     * TooManyRequests when too many wrong ones came for this address or from this network address.
     */
    async checkPassword(email: string, password: string, ip: string): Promise<StoredAccount | undefined> {
      await limits.take('sign-in-anywhere', ip);
      await limits.take('sign-in', email, ip);
      const account = await accountByEmail(knex, email);
      if (!(await passwordMatches(password, account?.passwordHash)) || !account) return undefined;
      await limits.giveBack('sign-in-anywhere', ip);
      await limits.giveBack('sign-in', email, ip);
      if (!account.confirmedAt) throw new EmailNotConfirmed();
      return account;
    },

    async requestPasswordReset(email: string): Promise<void> {
      await limits.take('account-mail', email);
      await knex.transaction(async (trx) => {
        const account = await lockedAccountByEmail(trx, email);
        if (account) await mailToken(trx, account, 'reset-password');
      });
    },

    /** Sets a new password and ends every session of the account; throws TokenNotValid. The mail proves the address as well. */
    async resetPassword(token: string, password: string, ip: string): Promise<void> {
      await limits.take('token', ip);
      const passwordHash = await hashPassword(password);
      await knex.transaction(async (trx) => {
        const now = clock();
        const accountId = await useToken(trx, 'reset-password', hashOfToken(token), now);
        const account = accountId === undefined ? undefined : await accountById(trx, accountId);
        if (!account) throw new TokenNotValid();
        await changeAccount(trx, account.id, { passwordHash, confirmedAt: account.confirmedAt ?? now });
        await endTokens(trx, account.id, 'reset-password', now);
        await endTokens(trx, account.id, 'confirm-email', now);
        await endSessionsOf(trx, account.id);
      });
    },
  };
}
